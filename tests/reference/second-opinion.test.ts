/**
 * The measurement core against a second opinion: 500 random cases each, computed by
 * second-opinion.py with scipy from the written rules, agree to 1e-9 of their value.
 */
import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { conformanceProbability } from "../../shared/delivery/conformance-probability.ts";
import { crossing } from "../../shared/delivery/crossing.ts";
import { fitLine } from "../../shared/delivery/fit-line.ts";
import { measureDelivery } from "../../shared/delivery/measure-delivery.ts";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import type { CheckBody, Run, Sequence, Syringe } from "../../shared/schemas/entry.ts";
import { logbook } from "../helpers/logbook-in-words.ts";

interface CompactCheck {
  syringe: number | null;
  runs: (Run | [number] | [number, number])[];
  oilTempC?: number;
}

interface SecondOpinion {
  syringes: Syringe[];
  sequences: Sequence[];
  fitLine: { points: [number, number, number][]; fit: number[] }[];
  crossing: { line: number[]; level: number; k: number; crossing: (number | null)[] }[];
  /** Value, u, lower limit, probability. */
  conformance: [number, number, number, number][];
  chain: {
    bike: { sequence: number; actDrop: number; watchDrop: number };
    first: CompactCheck[];
    later: CompactCheck[];
    expect: {
      checks: number[][];
      disagree: [number, number];
      baseline: [number, number, number];
      firstAction: string;
      ratio: [number, number];
      p: [number, number];
      verdict: string;
      action: string;
      runsToSettle: number | null;
    };
  }[];
}

const opinion = JSON.parse(
  readFileSync(new URL("second-opinion.json", import.meta.url), "utf8"),
) as SecondOpinion;

/** Equal, number by number, to 1e-9 of the value. */
function expectSame(mine: (number | null | undefined)[], theirs: (number | null)[], what: string) {
  const same = theirs.map((their, i) => {
    const value = mine[i];
    if (typeof their !== "number" || typeof value !== "number") return their === value;
    return Math.abs(value - their) <= 1e-9 * Math.abs(their);
  });
  if (mine.length !== theirs.length || same.includes(false))
    expect(mine, `${what} differs by more than 1e-9`).toEqual(theirs);
}

test("a second opinion was asked at least 500 times of each", () => {
  for (const cases of [opinion.fitLine, opinion.crossing, opinion.conformance, opinion.chain])
    expect(cases.length).toBeGreaterThanOrEqual(500);
});

test("fitLine agrees with a QR decomposition", () => {
  opinion.fitLine.forEach(({ points, fit }, i) => {
    const mine = fitLine(points.map(([x, y, u]) => ({ x, y, u })))!;
    const { intercept, slope, uIntercept, uSlope, covariance, chiSquared } = mine;
    const values = [intercept, slope, uIntercept, uSlope, covariance, chiSquared];
    expectSame(values, fit, `line ${i}`);
  });
});

test("crossing agrees with root finding on exact numbers", () => {
  opinion.crossing.forEach(({ line, level, k, crossing: theirs }, i) => {
    const [intercept, slope, uIntercept, uSlope, covariance] = line as [
      number,
      number,
      number,
      number,
      number,
    ];
    const { at, low, high } = crossing(
      { intercept, slope, uIntercept, uSlope, covariance },
      level,
      k,
    )!;
    expectSame([at, low, high], theirs, `crossing ${i}`);
  });
});

test("conformanceProbability agrees with scipy.stats.norm", () => {
  opinion.conformance.forEach(([value, u, limit, probability], i) => {
    expectSame([conformanceProbability(value, u, limit)], [probability], `probability ${i}`);
  });
});

function bodyOf({ syringe, runs, oilTempC }: CompactCheck): CheckBody {
  return {
    syringe: syringe === null ? null : opinion.syringes[syringe]!,
    runs: runs.map((run): Run => {
      if (!Array.isArray(run)) return run;
      const [first, second] = run;
      return second === undefined ? { deliveredMl: first } : { startMl: first, endMl: second };
    }),
    ...(oilTempC === undefined ? {} : { oilTempC }),
    closedOut: true,
  };
}

describe("the whole way from checks to a verdict", () => {
  const cases = opinion.chain.map((chain) => ({
    ...chain,
    sequence: opinion.sequences[chain.bike.sequence]!,
    first: chain.first.map(bodyOf),
    later: chain.later.map(bodyOf),
  }));

  test("each check is the same delivery, with the same parts", () => {
    cases.forEach(({ first, later, sequence, expect: theirs }, i) => {
      [...first, ...later].forEach((body, j) => {
        const { delivery, flags } = measureDelivery(body, sequence);
        const { perRunMl, uMl, uScaleMl, components, runsCounted, fills } = delivery!;
        const { readingMl, repeatabilityMl, temperatureMl } = components;
        const parts = [readingMl, repeatabilityMl, temperatureMl];
        expectSame(
          [perRunMl, uMl, uScaleMl, ...parts, runsCounted, fills, +flags.includes("runs-scatter")],
          theirs.checks[j]!,
          `check ${j} of chain ${i}`,
        );
      });
    });
  });

  test("the logbook gives the same baseline, ratio, probabilities, verdict, action and runs", () => {
    cases.forEach(({ bike, first, later, sequence, expect: theirs }, i) => {
      const book = logbook().bike({ ...bike, name: "Moss", sequence });
      first.forEach((body, j) => book.check(10 + j / 4, [], body));
      later.forEach((body, j) => book.check(30 + j / 4, [], body));
      const summary = summariseLogbook({ ownerId: "owner", entries: book.entries });
      const [settling, judged] = [summary.checks[0]!, summary.checks.at(-1)!];
      const { perRunMl, uMl, uScaleMl } = summary.series[0]!.baseline!;

      const what = `chain ${i}`;
      expectSame([perRunMl, uMl, uScaleMl], theirs.baseline, what);
      expectSame([judged.ratio, judged.uRatio], theirs.ratio, what);
      expectSame([judged.pLow, judged.pDropping], theirs.p, what);
      expectSame([judged.runsToSettle], [theirs.runsToSettle], what);
      const disagree = [settling, judged].map(({ flags }) => +flags.includes("session-disagrees"));
      expect([settling.action, judged.verdict, judged.action, disagree], what).toEqual([
        theirs.firstAction,
        theirs.verdict,
        theirs.action,
        theirs.disagree,
      ]);
    });
  });
});
