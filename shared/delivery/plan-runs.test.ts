import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { planRuns, type RunPlan } from "./plan-runs.ts";
import { runsPerFill } from "./runs-per-fill.ts";

const plan = (expectedMl: number, capacityMl: number, graduationMl: number, rest = {}) =>
  planRuns({
    expectedMl,
    syringe: { capacityMl, graduationMl },
    uBaselineRelative: null,
    actDrop: 0.15,
    ...rest,
  });

const plans: fc.Arbitrary<RunPlan> = fc.record({
  expectedMl: fc.double({ min: 0, max: 1_000, noNaN: true }),
  syringe: fc.record({
    capacityMl: fc.double({ min: 0, max: 200, noNaN: true, minExcluded: true }),
    graduationMl: fc.double({ min: 0, max: 100, noNaN: true, minExcluded: true }),
  }),
  uBaselineRelative: fc.option(fc.double({ min: 0, noNaN: true, noDefaultInfinity: true })),
  actDrop: fc.double({ min: 0.01, max: 0.15, noNaN: true }),
});

describe("planRuns", () => {
  test("asks 3 runs of 1 mL of a 5/0.2 barrel, in one fill (the documented example)", () => {
    const planned = plan(1, 5, 0.2);
    expect(planned).toMatchObject({ runs: 3, fills: 1 });
    // By hand: marks 0.04/6/9 and scatter 0.0004/3, the baseline's 6 runs in 2 fills 0.04/3/36 and 0.0004/6.
    expect(planned).toHaveProperty("uRatio", expect.closeTo(Math.sqrt(59 / 45_000), 12));
  });

  test("asks 2 runs of 1 mL of a 2.5/0.1 barrel", () => {
    expect(plan(1, 2.5, 0.1)).toMatchObject({ runs: 2, fills: 1 });
  });

  test("counts the baseline as it is where there is one", () => {
    expect(plan(1, 5, 0.2, { uBaselineRelative: 0 })).toMatchObject({ runs: 2 });
    expect(plan(1, 5, 0.2, { uBaselineRelative: 0.046 })).toEqual({
      runs: null,
      reason: "marks-too-coarse",
    });
  });

  test("says that the barrel is too small for one run", () => {
    expect(plan(5.5, 5, 0.2)).toEqual({ runs: null, reason: "barrel-too-small" });
  });

  test("says that the marks are too coarse, or that nothing is expected", () => {
    expect(plan(1, 2.5, 1)).toEqual({ runs: null, reason: "marks-too-coarse" });
    expect(plan(0, 5, 0.2)).toEqual({ runs: null, reason: "marks-too-coarse" });
  });

  test("answers a whole number from 1 to 10 that reaches the aim, or a reason", () => {
    fc.assert(
      fc.property(plans, (asked) => {
        const before = structuredClone(asked);
        const planned = planRuns(asked);
        expect(asked).toEqual(before);
        if (planned.runs === null) return;
        expect(planned.runs).toBeGreaterThanOrEqual(1);
        expect(planned.runs).toBeLessThanOrEqual(10);
        expect(planned.fills).toBeLessThanOrEqual(planned.runs);
        expect(planned.uRatio).toBeLessThanOrEqual(asked.actDrop / 3.29);
      }),
    );
  });

  test("is the same for a barrel, marks and delivery twice as large", () => {
    fc.assert(
      fc.property(plans, (asked) => {
        const { capacityMl, graduationMl } = asked.syringe;
        fc.pre(graduationMl > 1e-300 && asked.expectedMl > 1e-300);
        const doubled = {
          ...asked,
          expectedMl: asked.expectedMl * 2,
          syringe: { capacityMl: capacityMl * 2, graduationMl: graduationMl * 2 },
        };
        expect(planRuns(doubled)).toEqual(planRuns(asked));
      }),
    );
  });

  test("asks no fewer runs of a tighter limit, and within one fill they are never less sure", () => {
    fc.assert(
      fc.property(plans, (asked) => {
        const lax = planRuns({ ...asked, actDrop: 0.15 });
        const tight = planRuns(asked);
        fc.pre(tight.runs !== null);
        expect(lax.runs).toBeLessThanOrEqual(tight.runs);
        if (lax.runs !== null && tight.fills === 1)
          expect(tight.uRatio).toBeLessThanOrEqual(lax.uRatio);
      }),
    );
  });

  test("empties the barrel as often as its size asks", () => {
    fc.assert(
      fc.property(plans, (asked) => {
        const planned = planRuns(asked);
        fc.pre(planned.runs !== null);
        const perFill = runsPerFill(asked.syringe.capacityMl, asked.expectedMl);
        expect(planned.fills).toBe(Math.ceil(planned.runs / perFill));
      }),
    );
  });
});
