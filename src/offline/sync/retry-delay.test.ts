import { describe, expect, it } from "vitest";
import { retryDelayMs } from "./retry-delay.ts";

describe("the delay before the next try", () => {
  it("is drawn below a ceiling that doubles up to 5 minutes", () => {
    const ceilings = [1, 2, 3, 8, 9, 50].map((failures) => retryDelayMs(failures, 1, null));
    expect(ceilings).toEqual([2_000, 4_000, 8_000, 256_000, 300_000, 300_000]);
    expect(retryDelayMs(9, 0.5, null)).toBe(150_000);
    expect(retryDelayMs(9, 0, null)).toBe(0);
  });

  it("is no shorter than the server asked for, up to an hour", () => {
    expect(retryDelayMs(1, 0, 30_000)).toBe(30_000);
    expect(retryDelayMs(9, 1, 30_000)).toBe(300_000);
    expect(retryDelayMs(1, 0, 1e12)).toBe(3_600_000);
  });
});
