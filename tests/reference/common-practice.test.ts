/** Common practice of the trade: no published source. */
import { describe, expect, test } from "vitest";
import { compareToBaseline, type Volume } from "../../shared/delivery/compare-to-baseline.ts";
import { identifySequence } from "../../shared/delivery/identify-sequence.ts";
import { judge } from "../../shared/delivery/judge.ts";
import { measureDelivery } from "../../shared/delivery/measure-delivery.ts";
import { checkIntervalHours } from "../../shared/delivery/next-due.ts";
import { usualSequences } from "../../shared/delivery/usual-sequences.ts";

const syringes = [
  { id: "a", label: "5 mL", capacityMl: 5, graduationMl: 0.2 },
  { id: "b", label: "10 mL", capacityMl: 10, graduationMl: 0.5 },
  { id: "c", label: "10 mL, fine", capacityMl: 10, graduationMl: 0.2 },
  null,
];

/** `runs` runs of `deliveredMl` each, a barrel fill a run. */
function delivered(deliveredMl: number, runs: number, syringe: (typeof syringes)[number]): Volume {
  const run = { startMl: 0, endMl: deliveredMl };
  const { delivery } = measureDelivery(
    { syringe, runs: Array.from({ length: runs }, () => run) },
    null,
  );
  if (!delivery) throw new Error("These runs count.");
  return { ...delivery, syringeId: syringe?.id ?? null };
}

describe("common practice of the trade (no published source)", () => {
  test("a delivery that fell from 3 mL to 2.5 mL is a fault developing: never ride", () => {
    const limits = { watchDrop: 0.08, actDrop: 0.15 };
    for (const then of syringes)
      for (const now of syringes)
        for (let runs = 1; runs <= 10; runs++) {
          const { ratio, uRatio } = compareToBaseline(
            delivered(2.5, runs, now),
            delivered(3, runs, then),
          );
          expect(judge(ratio, uRatio, limits).action).not.toBe("ride");
        }
  });

  test("a check falls due every 20 to 40 engine hours, sooner with no screen before the pump", () => {
    const interval = (hasScreen: boolean | null) =>
      checkIntervalHours({ intervalHours: null, hasScreen });
    expect(interval(false)).toBe(20);
    expect(interval(true)).toBe(40);
    expect(interval(null)).toBe(20);
  });

  test("a two-rate 30 s sequence gives about 1 mL, a fast one 3 mL, a fast 60 s one 5.5 mL", () => {
    const nominalOf = (seconds: number, rhythm: "steady" | "alternating") => {
      const id = identifySequence({ seconds, rhythm });
      return usualSequences.find((sequence) => sequence.id === id)?.nominalMl;
    };
    expect(nominalOf(30, "alternating")).toBe(1);
    expect(nominalOf(30, "steady")).toBe(3);
    expect(nominalOf(60, "steady")).toBe(5.5);
  });

  test("fast ticking gives 0.09 to 0.1 mL/s in both fast sequences", () => {
    const fast = usualSequences.filter(({ rhythm }) => rhythm === "steady");
    expect(fast).toHaveLength(2);
    for (const { nominalMl, seconds } of fast) {
      expect(nominalMl / seconds).toBeGreaterThanOrEqual(0.09);
      expect(nominalMl / seconds).toBeLessThanOrEqual(0.1);
    }
  });

  test("runs of one check over 5 % apart with a fine syringe: look for air", () => {
    const fine = { id: "f", label: "10 mL, very fine", capacityMl: 10, graduationMl: 0.02 };
    const flagsOf = (secondMl: number) => {
      const runs = [3, secondMl].map((endMl) => ({ startMl: 0, endMl }));
      return measureDelivery({ syringe: fine, runs }, null).flags;
    };
    expect(flagsOf(3 * 1.06)).toContain("runs-scatter");
    expect(flagsOf(3 * 1.05)).toEqual([]);
  });
});
