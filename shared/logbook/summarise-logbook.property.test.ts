import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { arbitraryLogbook, OWNER, schemaLogbook } from "../../tests/helpers/arbitrary-logbook.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import {
  actions,
  rhythms,
  verdicts,
  workItems,
  type LogEntry,
  type Rhythm,
  type WorkItem,
} from "../schemas/entry.ts";
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

/** Barrels that ISO 7886-1 holds to one rule at all the scales below. */
const syringes = [
  { id: "ten", label: "10 mL", capacityMl: 10, graduationMl: 0.2 },
  { id: "twenty", label: "20 mL", capacityMl: 20, graduationMl: 0.5 },
] as const;

interface LifeCheck {
  ridden: number;
  runs: number[];
  syringe: (typeof syringes)[number];
  slip: number;
}
type LifeStep =
  | LifeCheck
  | { items: [WorkItem]; startsSeries: boolean }
  | { rhythm: Rhythm }
  | { reading: number };

const tenths = (min: number, max: number) => fc.integer({ min, max }).map((n) => n / 10);
/** How far the hours written down lie from those ridden. */
const slip = fc.oneof(
  { weight: 6, arbitrary: fc.constant(0) },
  { weight: 1, arbitrary: tenths(-8, 8) },
  { weight: 1, arbitrary: tenths(-900, 900) },
  { weight: 1, arbitrary: fc.constant(9_000) },
);
const lifeCheck = (runs: fc.Arbitrary<number[]>): fc.Arbitrary<LifeCheck> =>
  fc.record({
    ridden: fc.constantFrom(0.3, 1.5, 6, 20, 20),
    runs,
    syringe: fc.constantFrom(...syringes),
    slip,
  });

/** Checks, and between them work that starts a series or does not, other sequences, hour readings. */
const life: fc.Arbitrary<LifeStep[]> = fc.array(
  fc.oneof(
    {
      weight: 5,
      arbitrary: lifeCheck(fc.array(tenths(20, 45), { minLength: 1, maxLength: 3 })),
    },
    {
      weight: 1,
      arbitrary: fc.record({
        items: fc.tuple(fc.constantFrom(...workItems)),
        startsSeries: fc.boolean(),
      }),
    },
    { weight: 1, arbitrary: fc.record({ rhythm: fc.constantFrom(...rhythms) }) },
    { weight: 2, arbitrary: fc.record({ reading: slip }) },
  ),
  { minLength: 1, maxLength: 12 },
);

function lifeOf(steps: readonly LifeStep[], scale = 1) {
  const book = logbook().bike({ name: "Moss" });
  let hours = 10;
  for (const step of steps) {
    if ("rhythm" in step)
      book.bike({ sequence: { seconds: 30, rhythm: step.rhythm, nominalMl: 3 * scale } });
    else if ("items" in step) book.work(hours, step.items, step.startsSeries);
    else if ("reading" in step) book.hours(Math.max(0, hours + step.reading));
    else {
      const { capacityMl, graduationMl, ...named } = step.syringe;
      hours += step.ridden;
      book.check(
        Math.max(0, hours + step.slip),
        step.runs.map((volume) => volume * scale),
        {
          syringe: { ...named, capacityMl: capacityMl * scale, graduationMl: graduationMl * scale },
        },
      );
    }
  }
  return book.entries;
}
const harshness = (action: (typeof actions)[number] | null) =>
  action === null ? -1 : actions.indexOf(action);

describe("a life of checks", () => {
  it("is due no earlier than its last session whose hours count began, else now", () => {
    fc.assert(
      fc.property(life, (steps) => {
        const { due, checks, series, hours } = summarise(lifeOf(steps));
        const doubted = new Set(hours.doubtful.map(({ entryId }) => entryId));
        const counted = checks.findLast(
          (check) => check.series === series.length - 1 && !doubted.has(check.entryId),
        );
        const now = hours.now ?? 0;
        // A session lies within an hour either way of its first check.
        const together = checks
          .map(({ atHours }) => atHours)
          .filter((atHours) => counted && Math.abs(atHours - counted.atHours) <= 2);
        if (counted && now >= counted.atHours - 1)
          expect(due.atHours).toBeGreaterThanOrEqual(Math.min(...together));
        else expect(due.atHours).toBe(now);
      }),
      RUNS,
    );
  });

  it("keeps its ratios, actions and due hours when all volumes are scaled", () => {
    fc.assert(
      fc.property(life, fc.constantFrom(2, 4, 0.5), (steps, scale) => {
        const plain = summarise(lifeOf(steps));
        const scaled = summarise(lifeOf(steps, scale));
        expect(scaled.due.atHours).toBeCloseTo(plain.due.atHours, 9);
        scaled.checks.forEach(({ ratio, verdict, action }, i) => {
          const before = plain.checks[i]!;
          expect([verdict, action]).toEqual([before.verdict, before.action]);
          if (ratio === null) expect(before.ratio).toBeNull();
          else expect(ratio).toBeCloseTo(before.ratio!, 12);
        });
      }),
      RUNS,
    );
  });

  it("never gives a lower last delivery a milder action, unless the higher one reads too high", () => {
    const volumes = fc.tuple(tenths(0, 45), tenths(0, 45));
    const lastCheck = lifeCheck(
      fc.integer({ min: 1, max: 3 }).map((runs) => Array<number>(runs).fill(1)),
    );
    fc.assert(
      fc.property(life, lastCheck, volumes, (steps, last, [a, b]) => {
        const of = (ml: number) =>
          summarise(lifeOf([...steps, { ...last, runs: last.runs.map((one) => one * ml) }]));
        const higher = of(Math.max(a, b));
        fc.pre(!higher.flags.includes("reads-high"));
        expect(harshness(of(Math.min(a, b)).action)).toBeGreaterThanOrEqual(
          harshness(higher.action),
        );
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
