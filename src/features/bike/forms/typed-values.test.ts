import { describe, expect, it } from "vitest";
import { optionalNumber, optionalText, typedHours, typedNumber } from "./typed-values.ts";

describe("typed values", () => {
  it("reads numbers with comma or point", () => {
    expect(typedNumber("3,8")).toBe(3.8);
    expect(optionalNumber(" 450 ")).toBe(450);
  });

  it("makes NaN of what is no number, for the schema to name the field", () => {
    expect(typedNumber("")).toBeNaN();
    expect(optionalNumber("lots")).toBeNaN();
    expect(typedHours("twelve")).toBeNaN();
  });

  it("reads hours as the meter shows them", () => {
    expect(typedHours("12.5")).toBe(12.5);
    expect(typedHours("12:30")).toBe(12.5);
    expect(typedHours("12:")).toBe(12);
  });

  it("tells left empty from zero", () => {
    expect(optionalNumber("")).toBeUndefined();
    expect(optionalNumber("0")).toBe(0);
    expect(typedHours(":")).toBeNull();
    expect(typedHours("")).toBeNull();
    expect(optionalText("  ")).toBeUndefined();
  });
});
