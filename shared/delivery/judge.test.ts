import { describe, expect, it } from "vitest";
import { compareToBaseline } from "./compare-to-baseline.ts";
import { judge, readsHigh } from "./judge.ts";
import { poolSession } from "./pool-session.ts";
import { runsToSettle, type FurtherRuns } from "./runs-to-settle.ts";

const usual = { watchDrop: 0.08, actDrop: 0.15 };
const volume = (
  perRunMl: number,
  uMl: number,
  syringeId: string | null = "a",
  uScaleMl = 0.05,
) => ({
  perRunMl,
  uMl,
  uScaleMl,
  syringeId,
});

describe("judge", () => {
  it("answers as its example says", () => {
    expect(judge(0.9, 0.045, usual)).toMatchObject({ verdict: "dropping", action: "repeat" });
    // Φ(−1.111), one-sided normal table.
    expect(judge(0.9, 0.045, usual).pLow).toBeCloseTo(0.1333, 4);
  });

  it("calls a ratio on the limit low, and just above it dropping", () => {
    expect(judge(0.85, 0.01, usual)).toMatchObject({ verdict: "low", action: "stop", pLow: 0.5 });
    expect(judge(0.851, 0.0001, usual)).toMatchObject({ verdict: "dropping", action: "ride" });
    expect(judge(0.92, 0.01, usual)).toMatchObject({ verdict: "dropping", pDropping: 0.5 });
    expect(judge(0.921, 0.01, usual).verdict).toBe("holding");
  });

  it("says ride only where it is 95 % sure that the delivery is not low", () => {
    expect(judge(1, 0.0911, usual).action).toBe("ride");
    expect(judge(1, 0.0913, usual).action).toBe("repeat");
  });

  it("judges an exact ratio without dividing by its uncertainty", () => {
    expect(judge(0.9, 0, usual)).toMatchObject({ pLow: 0, pDropping: 1, action: "ride" });
  });

  it("asks for a repeat where the reading is far too high", () => {
    expect(readsHigh(1.2, 0.03)).toBe(true);
    expect(readsHigh(1.2, 0.04)).toBe(false);
    expect(judge(1.2, 0.03, usual)).toMatchObject({ verdict: "holding", action: "repeat" });
  });

  it("follows a bike's tighter limits", () => {
    expect(judge(0.93, 0.01, { watchDrop: 0.05, actDrop: 0.1 }).verdict).toBe("dropping");
    expect(judge(0.89, 0.01, { watchDrop: 0.05, actDrop: 0.1 }).action).toBe("stop");
  });
});

describe("compareToBaseline", () => {
  it("answers as its example says, without the scale they share", () => {
    const { ratio, uRatio } = compareToBaseline(volume(2.7, 0.1), volume(3, 0.1));
    expect(ratio).toBeCloseTo(0.9, 12);
    expect(uRatio).toBeCloseTo(0.04485, 5);
  });

  it("counts both scales in where the syringes differ or are not known", () => {
    // √[(0.1² + 0.05²)/3² + 0.9²·(0.1² + 0.05²)/3²]
    for (const [a, b] of [
      ["a", "b"],
      [null, null],
    ] as const) {
      const { uRatio } = compareToBaseline(volume(2.7, 0.1, a), volume(3, 0.1, b));
      expect(uRatio).toBeCloseTo(0.050139, 5);
    }
  });

  it("compares a delivery of nothing", () => {
    expect(compareToBaseline(volume(0, 0.1), volume(3, 0.1))).toEqual({
      ratio: 0,
      uRatio: 0.1 / 3,
    });
  });
});

describe("poolSession", () => {
  it("answers as its example says", () => {
    const pooled = poolSession([volume(2.6, 0.1), volume(2.8, 0.1)]);
    expect(pooled.perRunMl).toBeCloseTo(2.7, 12);
    expect(pooled.uMl).toBeCloseTo(0.070711, 6);
    expect(pooled).toMatchObject({ uScaleMl: 0.05, syringeId: "a", disagrees: false });
  });

  it("weighs by 1/u²", () => {
    // (2·100 + 3·25)/125
    expect(poolSession([volume(2, 0.1), volume(3, 0.2)]).perRunMl).toBeCloseTo(2.2, 12);
  });

  it("is said to disagree where χ² passes its 95 % point", () => {
    // χ² = 2·(0.5·d/0.1)²: 3.92 at d = 0.28, 3.645 at d = 0.27; the point is 3.841.
    expect(poolSession([volume(2.6, 0.1), volume(2.88, 0.1)]).disagrees).toBe(true);
    expect(poolSession([volume(2.6, 0.1), volume(2.87, 0.1)]).disagrees).toBe(false);
  });

  it("counts each scale in where more than one syringe was used", () => {
    const pooled = poolSession([volume(2.6, 0.1, "a"), volume(2.6, 0.1, "b")]);
    expect(pooled).toMatchObject({ syringeId: null, uScaleMl: 0 });
    expect(pooled.uMl).toBeCloseTo(Math.sqrt(0.0125 / 2), 9);
  });

  it("leaves a single check as it is", () => {
    expect(poolSession([volume(2.6, 0.1)])).toEqual({ ...volume(2.6, 0.1), disagrees: false });
  });
});

describe("runsToSettle", () => {
  const further = (more: Partial<FurtherRuns>): FurtherRuns => ({
    session: volume(2.7, 0.0986),
    baseline: volume(3, 0.04),
    limits: usual,
    capacityMl: 5,
    graduationMl: 0.2,
    repeatability: 0.02,
    temperatureMl: 0.0112,
    ...more,
  });

  it("is 0 where the verdict is settled, either way", () => {
    expect(runsToSettle(further({ session: volume(2.95, 0.1) })).runs).toBe(0);
    expect(runsToSettle(further({ session: volume(2.1, 0.1) })).runs).toBe(0);
  });

  it("is the fewest further runs that bring pLow to 0.05 (the documented example)", () => {
    // At r = 0.9 that takes u ≤ 0.05/1.645 = 0.0304, of which the baseline has 0.9·0.0133 = 0.0120:
    // u(V) ≤ 3·0.0279 = 0.0838. One more run (0.0991) pools to 0.0699.
    expect(runsToSettle(further({}))).toEqual({ runs: 1, baselineForbids: false });
  });

  it("is null, and blames the baseline, where perfect runs would not do", () => {
    expect(runsToSettle(further({ baseline: volume(3, 0.102) }))).toEqual({
      runs: null,
      baselineForbids: true,
    });
  });

  it("is null without blame where it only takes too many runs", () => {
    expect(
      runsToSettle(further({ session: volume(2.6, 0.1), baseline: volume(3, 0.001) })),
    ).toEqual({
      runs: null,
      baselineForbids: false,
    });
  });
});
