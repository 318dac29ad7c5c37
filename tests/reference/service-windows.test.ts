import { describe, expect, test } from "vitest";
import { judge } from "../../shared/delivery/judge.ts";
import { USUAL_ACT_DROP, USUAL_WATCH_DROP } from "../../shared/schemas/entry.ts";

/** mL accepted of other two-stroke oil pumps: service manuals and service data. */
const windows = [
  ["watercraft A, a port: 1500 rpm, 30 s, full lever", 0.83, 1.0],
  ["watercraft B, the same", 1.24, 1.51],
  ["watercraft C, the same", 0.71, 0.87],
  ["50 cc quad: 2000 rpm, 5 min, full open", 0.6, 0.8],
  ["50 cc scooter A: 3000 rpm, 5 min", 0.9, 1.1],
  ["50 cc scooter B, the same", 0.8, 1.0],
  ["outboard, 2 cylinders: 1500 rpm, 5 min, released", 2.7, 3.5],
] as const;

const limits = { watchDrop: USUAL_WATCH_DROP, actDrop: USUAL_ACT_DROP };
const EXACT = 1e-9;

describe("published acceptance windows of oil pumps, their middle as the baseline", () => {
  test.each(windows)("the least that is accepted of %s is dropping, not low", (_, low, high) => {
    const ratio = low / ((low + high) / 2);
    expect(ratio).toBeGreaterThanOrEqual(0.857);
    expect(ratio).toBeLessThan(0.9075);
    expect(judge(ratio, EXACT, limits).verdict).toBe("dropping");
  });

  test.each(windows)("what is low lies outside the window of %s", (_, low, high) => {
    const middle = (low + high) / 2;
    const lowFrom = (1 - USUAL_ACT_DROP) * middle;
    expect(judge(lowFrom / middle, EXACT, limits).verdict).toBe("low");
    expect(lowFrom).toBeLessThan(low);
  });
});
