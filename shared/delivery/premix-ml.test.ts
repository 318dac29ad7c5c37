import { describe, expect, test } from "vitest";
import { premixMl } from "./premix-ml.ts";

describe("premixMl", () => {
  test("mixes 100 mL into 5 L at 50:1 (the documented example)", () => {
    expect(premixMl(5, 50)).toBe(100);
  });

  test("mixes nothing into nothing", () => {
    expect(premixMl(0, 50)).toBe(0);
  });

  test.each([
    [5, 0],
    [5, -50],
    [-5, 50],
    [5, Number.NaN],
    [Number.NaN, 50],
    [5, Number.MIN_VALUE],
  ])("answers null for %f litres at %f:1", (litres, ratio) => {
    expect(premixMl(litres, ratio)).toBeNull();
  });
});
