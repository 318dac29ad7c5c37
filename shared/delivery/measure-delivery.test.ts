import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Run } from "../schemas/entry.ts";
import { measureDelivery } from "./measure-delivery.ts";

const fine = { id: "fine", label: "2.5 mL", capacityMl: 2.5, graduationMl: 0.1 };
const coarse = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const runsEach = (...endMl: number[]): Run[] => endMl.map((end) => ({ startMl: 0, endMl: end }));
const measure = (runs: Run[], syringe: typeof fine | null = fine, oilTempC = 15) =>
  measureDelivery({ syringe, runs, oilTempC }, null);

describe("measureDelivery", () => {
  it("answers as its example says", () => {
    const { delivery } = measureDelivery({ syringe: fine, runs: runsEach(1) }, null);
    expect(delivery?.perRunMl).toBeCloseTo(0.996, 3);
    expect(delivery?.uMl).toBeCloseTo(0.0455, 4);
  });

  it("reads only the ends of a barrel that goes on filling", () => {
    const goingOn = measure([
      { startMl: 0.2, endMl: 1.2 },
      { startMl: 1.2, endMl: 2.2 },
    ]);
    const anew = measure(runsEach(1, 1));
    expect(goingOn.delivery).toMatchObject({ fills: 1, runsCounted: 2 });
    expect(anew.delivery).toMatchObject({ fills: 2, runsCounted: 2 });
    // √2·0.1/√12/2 and √4·0.1/√12/2.
    expect(goingOn.delivery?.components.readingMl).toBeCloseTo(0.020412, 6);
    expect(anew.delivery?.components.readingMl).toBeCloseTo(0.028868, 6);
  });

  it("begins a new fill after a void run", () => {
    const { delivery, flags } = measure([
      { startMl: 0, endMl: 1 },
      { startMl: 1, endMl: 1.3, void: true },
      { startMl: 1.3, endMl: 2.3 },
    ]);
    expect(delivery).toMatchObject({ fills: 2, runsCounted: 2 });
    expect(delivery?.perRunMl).toBeCloseTo(1, 12);
    expect(flags).toEqual(["void-runs"]);
  });

  it("leaves out runs of another length or rhythm than the bike's sequence", () => {
    const sequence = { seconds: 30, rhythm: "alternating" } as const;
    const runs: Run[] = [
      { startMl: 0, endMl: 1, seconds: 35 },
      { startMl: 0, endMl: 1.9, seconds: 37 },
      { startMl: 0, endMl: 2.3, seconds: 30, rhythm: "steady" },
    ];
    const { delivery, flags } = measureDelivery({ syringe: fine, runs }, sequence);
    expect(delivery?.runsCounted).toBe(1);
    expect(flags).toEqual(["other-sequence"]);
  });

  it("says so where nothing is left to count", () => {
    expect(measure([{ startMl: 0, endMl: 1, void: true }])).toEqual({
      delivery: null,
      flags: ["void-runs", "nothing-to-count"],
    });
  });

  it("blames the runs only where marks and 2 % do not explain their scatter", () => {
    // m = 0.1²/6 = 0.001667; the limit is 3.841·(0.001667 + 0.0004) for 1 mL: apart by 0.126 mL.
    expect(measure(runsEach(0.95, 1.05)).flags).toEqual([]);
    const scattering = measure(runsEach(0.9, 1.1));
    expect(scattering.flags).toEqual(["runs-scatter"]);
    // s_obs² = 0.02; s = √(0.02 − 0.001667) = 0.1354; s/√2.
    expect(scattering.delivery?.components.repeatabilityMl).toBeCloseTo(0.095743, 5);
  });

  it("assumes marks of 0.2 mL, and a 5 % scale, for a syringe that is not known", () => {
    const { delivery, flags } = measure([{ deliveredMl: 3 }], null);
    expect(flags).toEqual(["syringe-unknown"]);
    expect(delivery?.components.readingMl).toBeCloseTo(0.08165, 5);
    expect(delivery?.uScaleMl).toBeCloseTo(0.15 / Math.sqrt(3), 9);
  });

  it("adds the scale's tolerance of every fill, since one scale errs one way", () => {
    // ISO 7886-1: 5 mL at 3 mL: 4 % = 0.12 mL a fill, whatever the number of fills.
    const one = measure(runsEach(3), coarse);
    const two = measure(runsEach(3, 3), coarse);
    expect(one.delivery?.uScaleMl).toBeCloseTo(0.12 / Math.sqrt(3), 9);
    expect(two.delivery?.uScaleMl).toBeCloseTo(0.12 / Math.sqrt(3), 9);
  });

  describe("within one fill", () => {
    const barrel = { id: "large", label: "100 mL", capacityMl: 100, graduationMl: 0.2 };
    /** Runs that go on in one barrel. */
    const goingOn = (volumes: number[]) => {
      let level = 0;
      return volumes.map((volume) => ({ startMl: level, endMl: (level += volume) }));
    };
    const graduations = fc.constantFrom(0.1, 0.2, 0.5, 1);
    const ofRuns = (volumes: number[], graduationMl: number) =>
      measure(goingOn(volumes), { ...barrel, graduationMl });

    it("never widens u by more runs of the same", () => {
      const volume = fc.integer({ min: 1, max: 60 }).map((n) => n / 10);
      fc.assert(
        fc.property(volume, fc.integer({ min: 1, max: 9 }), graduations, (ml, runs, marks) => {
          const of = (n: number) => ofRuns(Array<number>(n).fill(ml), marks).delivery!;
          const [fewer, more] = [of(runs), of(runs + 1)];
          expect(more.fills).toBe(1);
          expect(more.uMl).toBeLessThan(fewer.uMl);
          expect(more.components.readingMl).toBeLessThan(fewer.components.readingMl);
          expect(more.components.repeatabilityMl).toBeLessThan(fewer.components.repeatabilityMl);
          expect(more.components.temperatureMl).toBeCloseTo(fewer.components.temperatureMl, 12);
        }),
      );
    });

    it("never widens u, as a part of the delivery, by another run, unless the runs scatter", () => {
      const volumes = fc.array(
        fc.integer({ min: 200, max: 240 }).map((n) => n / 100),
        { minLength: 2, maxLength: 10 },
      );
      fc.assert(
        fc.property(volumes, graduations, (all, marks) => {
          const more = ofRuns(all, marks);
          fc.pre(!more.flags.includes("runs-scatter"));
          const fewer = ofRuns(all.slice(0, -1), marks);
          const part = ({ delivery }: typeof more) => delivery!.uMl / delivery!.perRunMl;
          expect(part(more)).toBeLessThan(part(fewer));
        }),
      );
    });
  });

  it("points out a level above the last mark", () => {
    expect(measure(runsEach(2.6)).flags).toEqual(["above-capacity"]);
  });
});
