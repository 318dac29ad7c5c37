import { describe, expect, test } from "vitest";
import { runsPerFill } from "./runs-per-fill.ts";

describe("runsPerFill", () => {
  test.each([
    [5, 1, 4],
    [2.5, 1, 2],
    [10, 3, 3],
    [5, 5.5, 0],
    [10, 5.5, 1],
    [5, 0.95, 5],
  ])("a %f mL barrel takes runs of %f mL: %i (by hand)", (capacity, expected, runs) => {
    expect(runsPerFill(capacity, expected)).toBe(runs);
  });

  test("stays a whole number where nothing, or next to nothing, is expected", () => {
    expect(runsPerFill(5, 0)).toBe(30);
    expect(runsPerFill(5, Number.MIN_VALUE)).toBe(30);
  });
});
