import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { arbitraryLogbook, OWNER, schemaLogbook } from "../../tests/helpers/arbitrary-logbook.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { actions, verdicts, type LogEntry, type WorkItem } from "../schemas/entry.ts";
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
      fc.property(fc.oneof(arbitraryLogbook, schemaLogbook), (entries) => {
        const summary = summarise(entries);
        expect(numbersIn(summary).every(Number.isFinite)).toBe(true);
        expect(summarySchema.parse(summary)).toEqual(summary);
      }),
      RUNS,
    );
  });

  it("has no lifetime hours below zero", () => {
    fc.assert(
      fc.property(fc.oneof(arbitraryLogbook, schemaLogbook), (entries) => {
        const { hours, checks, series, due } = summarise(entries);
        const lifetimes = [
          hours.now,
          due.atHours,
          ...[...checks, ...series, ...hours.doubtful].map(({ atHours }) => atHours),
          ...series.map(({ baseline }) => baseline?.atHours),
        ];
        for (const lifetime of lifetimes) expect(lifetime ?? 0).toBeGreaterThanOrEqual(0);
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
});

const ml = fc.integer({ min: 15, max: 40 }).map((n) => n / 10);
/** What may be typed where the meter shows 150. */
const typed = fc.oneof(
  fc.constantFrom(15, 141, 150.4, 151.2, 158, 1_500, 9_000),
  fc.integer({ min: 1_400, max: 1_600 }).map((n) => n / 10),
);

/** One to three series, each of a check or two, 20 h apart. */
const earlierSeries = fc.array(
  fc.record({
    checks: fc.array(ml, { minLength: 1, maxLength: 2 }),
    item: fc.constantFrom<WorkItem>("pump-renewed", "screen-cleaned"),
  }),
  { minLength: 1, maxLength: 3 },
);

/** A life whose last check is repeated every five minutes, read at the hours given. */
function repeating(
  earlier: { checks: number[]; item: WorkItem }[],
  startsSeries: boolean,
  repeats: { ml: number; hours: number }[],
) {
  const at = (days: number, minutes = 0) =>
    new Date(Date.UTC(2026, 2, 1 + days, 9, minutes)).toISOString();
  const book = logbook().bike({ name: "Moss" }, null, at(0));
  earlier.forEach(({ checks, item }, i) => {
    if (i > 0) book.work(40 * i, [item], true, at(40 * i));
    checks.forEach((one, j) => book.check(40 * i + 20 * j, [one], {}, at(40 * i + 20 * j)));
  });
  if (startsSeries) book.work(149, ["screen-cleaned"], true, at(180));
  repeats.forEach((one, i) => book.check(one.hours, [one.ml], {}, at(181, 5 * i)));
  const { verdict, action } = summarise(book.entries);
  return { verdict: verdicts.indexOf(verdict), action: harshness(action) };
}

describe("a check repeated until it pleases", () => {
  const first = fc.record({ ml, hours: fc.constantFrom(150, 9_000) });
  const repeats = fc.array(fc.record({ ml, hours: typed }), { minLength: 1, maxLength: 8 });

  it("is never judged milder than all its evidence pooled, whatever hours are typed", () => {
    fc.assert(
      fc.property(earlierSeries, fc.boolean(), first, repeats, (earlier, starts, one, more) => {
        const all = [one, ...more];
        const odd = repeating(earlier, starts, all);
        const pooled = repeating(
          earlier,
          starts,
          all.map((check) => ({ ...check, hours: 150 })),
        );
        expect(odd.action).toBeGreaterThanOrEqual(pooled.action);
        expect(odd.verdict).toBeGreaterThanOrEqual(pooled.verdict);
      }),
      RUNS,
    );
  });
});
