import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { arbitraryLogbook, OWNER } from "../../tests/helpers/arbitrary-logbook.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { actions, type LogEntry } from "../schemas/entry.ts";
import { summarySchema } from "../schemas/summary.ts";
import { standingEntries } from "./standing-entries.ts";
import { summariseLogbook } from "./summarise-logbook.ts";

const RUNS = { numRuns: 400, seed: 20261 };
const summarise = (entries: readonly LogEntry[]) => summariseLogbook({ ownerId: OWNER, entries });
const shuffled = (entries: LogEntry[]) =>
  fc.shuffledSubarray(entries, { minLength: entries.length, maxLength: entries.length });

function numbersIn(value: unknown): number[] {
  if (typeof value === "number") return [value];
  return value && typeof value === "object" ? Object.values(value).flatMap(numbersIn) : [];
}

describe("any logbook", () => {
  it("is summarised without a NaN, an infinity or a throw, into the agreed shape", () => {
    fc.assert(
      fc.property(arbitraryLogbook, (entries) => {
        const summary = summarise(entries);
        expect(numbersIn(summary).every(Number.isFinite)).toBe(true);
        expect(summarySchema.parse(summary)).toEqual(summary);
      }),
      RUNS,
    );
  });

  it("gives the same answer in any order and with any repeats", () => {
    const reordered = arbitraryLogbook.chain((entries) =>
      fc.tuple(fc.constant(entries), shuffled(entries), fc.subarray(entries)),
    );
    fc.assert(
      fc.property(reordered, ([entries, others, repeats]) => {
        expect(summarise([...repeats, ...others, ...repeats])).toEqual(summarise(entries));
      }),
      RUNS,
    );
  });

  it("is not changed by being read", () => {
    fc.assert(
      fc.property(arbitraryLogbook, (entries) => {
        const before = structuredClone(entries);
        summarise(entries);
        expect(entries).toEqual(before);
      }),
      RUNS,
    );
  });

  it("reads as if a struck entry had never been", () => {
    fc.assert(
      fc.property(arbitraryLogbook, (entries) => {
        const { struck } = standingEntries(OWNER, entries);
        const never = entries.filter(({ id, kind }) => !struck.has(id) && kind !== "strike");
        expect({ ...summarise(entries), bikeId: "" }).toEqual({ ...summarise(never), bikeId: "" });
      }),
      RUNS,
    );
  });

  it("says something of every check that counts, and null only while settling", () => {
    fc.assert(
      fc.property(arbitraryLogbook, (entries) => {
        const { checks, verdict, action } = summarise(entries);
        expect(action === null).toBe(verdict === "none");
        for (const check of checks)
          expect([check.ratio, check.uRatio, check.pLow].includes(null)).toBe(
            check.verdict === "settling",
          );
      }),
      RUNS,
    );
  });
});

/** A plain life: a check every 20 h, each of one to three runs. */
const volumes = fc.array(
  fc.array(
    fc.integer({ min: 20, max: 45 }).map((n) => n / 10),
    { minLength: 1, maxLength: 3 },
  ),
  { minLength: 2, maxLength: 8 },
);
const lifeOf = (checks: number[][], scale = 1) => {
  const book = logbook().bike({ name: "Moss" });
  const syringe = { id: "s", label: "s", capacityMl: 5 * scale, graduationMl: 0.2 * scale };
  checks.forEach((runs, i) =>
    book.check(
      10 + 20 * i,
      runs.map((volume) => volume * scale),
      { syringe },
    ),
  );
  return book;
};
const harshness = (action: (typeof actions)[number] | null) =>
  action === null ? -1 : actions.indexOf(action);

describe("a plain life of checks", () => {
  it("is due no earlier than its last session", () => {
    fc.assert(
      fc.property(volumes, (checks) => {
        const { due, checks: judged } = summarise(lifeOf(checks).entries);
        expect(due.atHours).toBeGreaterThanOrEqual(judged.at(-1)!.atHours);
      }),
      RUNS,
    );
  });

  it("keeps its ratios when all volumes are scaled", () => {
    fc.assert(
      fc.property(volumes, fc.constantFrom(2, 4, 0.5), (checks, scale) => {
        const plain = summarise(lifeOf(checks).entries);
        const scaled = summarise(lifeOf(checks, scale).entries);
        scaled.checks.forEach(({ ratio, verdict, action }, i) => {
          const before = plain.checks[i]!;
          expect([verdict, action]).toEqual([before.verdict, before.action]);
          if (ratio !== null) expect(ratio).toBeCloseTo(before.ratio!, 12);
        });
      }),
      RUNS,
    );
  });

  it("never gives a lower delivery a milder action", () => {
    const lower = fc.tuple(
      fc.integer({ min: 1, max: 34 }).map((n) => n / 10),
      fc.integer({ min: 1, max: 34 }).map((n) => n / 10),
    );
    fc.assert(
      fc.property(lower, ([a, b]) => {
        const of = (ml: number) => harshness(summarise(lifeOf([[3], [ml]]).entries).action);
        expect(of(Math.min(a, b))).toBeGreaterThanOrEqual(of(Math.max(a, b)));
      }),
      RUNS,
    );
  });

  it("does not ride on by repeating a low check until one pleases", () => {
    // Pooled evidence: k checks of 2.4 mL and one of 3.0 weigh as their weighted mean.
    const book = lifeOf([[3], [2.4]]);
    expect(summarise(book.entries).action).toBe("stop");
    expect(summarise(book.check(30.2, [3]).entries).action).not.toBe("ride");
    const stubborn = lifeOf([[3], [2.4]])
      .check(30.1, [2.4])
      .check(30.2, [2.4])
      .check(30.3, [3]);
    expect(summarise(stubborn.entries).action).toBe("stop");
  });
});
