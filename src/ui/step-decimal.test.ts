import { describe, expect, it } from "vitest";
import { stepDecimal } from "./step-decimal.ts";

describe("stepDecimal", () => {
  it("steps without the dust of binary fractions", () => {
    expect(stepDecimal("0.2", 0.1)).toBe("0.3");
    expect(stepDecimal("12.0", 0.1)).toBe("12.1");
    expect(stepDecimal("12", 0.5)).toBe("12.5");
  });

  it("keeps the decimals that were typed", () => {
    expect(stepDecimal("3,75", -0.1)).toBe("3.65");
    expect(stepDecimal("2.50", 1)).toBe("3.50");
  });

  it("stops at the limits", () => {
    expect(stepDecimal("0.05", -0.1, { min: 0 })).toBe("0.00");
    expect(stepDecimal("9.9", 0.2, { max: 10 })).toBe("10.0");
  });

  it("starts from nothing where no number stands", () => {
    expect(stepDecimal("", 0.2, { min: 0 })).toBe("0.2");
    expect(stepDecimal("abc", -0.2, { min: 0 })).toBe("0.0");
  });
});
