import fc from "fast-check";
import {
  actions,
  entrySchema,
  meterFormats,
  meterKinds,
  rhythms,
  workItems,
  type LogEntry,
} from "../../shared/schemas/entry.ts";
import { arbitraryOf } from "./fuzz/arbitrary-of-schema.ts";

export const OWNER = "owner";
const BIKE = "0190a000-0000-7000-8000-000000000001";

const decimals = (max: number, digits = 2) =>
  fc.integer({ min: 0, max: max * 10 ** digits }).map((n) => n / 10 ** digits);
const hours = fc.oneof(
  { weight: 8, arbitrary: decimals(400, 1) },
  { weight: 1, arbitrary: fc.constantFrom(0, 100_000, 1e-9) },
);
const ids = fc
  .integer({ min: 0, max: 40 })
  .map((n) => `0190a000-0000-7000-9000-${String(n).padStart(12, "0")}`);
const instants = fc
  .oneof(
    { weight: 8, arbitrary: fc.integer({ min: 0, max: 365 * 24 * 60 }) },
    { weight: 1, arbitrary: fc.constantFrom(-29_000_000, 38_000_000) },
  )
  .map((minutes) => new Date(Date.UTC(2026, 0, 1) + minutes * 60_000).toISOString());

const sequence = fc.record({
  seconds: fc.constantFrom(30, 60, 45),
  rhythm: fc.constantFrom(...rhythms),
  nominalMl: fc.option(fc.constantFrom(1, 3, 5.5)),
});
const syringe = fc.constantFrom(
  { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 },
  { id: "fine", label: "2.5 mL", capacityMl: 2.5, graduationMl: 0.1 },
  { id: "ten", label: "10 mL", capacityMl: 10, graduationMl: 0.5 },
);
const optional = { requiredKeys: [] as [] };
const run = fc.oneof(
  fc
    .record({
      startMl: decimals(1),
      delivered: decimals(5),
      more: fc.record(
        {
          seconds: fc.constantFrom(30, 60, 31),
          rhythm: fc.constantFrom(...rhythms),
          void: fc.boolean(),
        },
        optional,
      ),
    })
    .map(({ startMl, delivered, more }) => ({ startMl, endMl: startMl + delivered, ...more })),
  fc.record({ deliveredMl: decimals(6) }),
);

const bodies = {
  bike: fc.record(
    {
      name: fc.constantFrom("Moss", "Fern"),
      meter: fc.constantFrom(...meterKinds),
      meterFormat: fc.constantFrom(...meterFormats),
      intervalHours: fc.option(fc.integer({ min: 1, max: 60 })),
      hasScreen: fc.option(fc.boolean()),
      sequence: fc.option(sequence),
      watchDrop: fc.option(fc.constantFrom(0.01, 0.05, 0.08)),
      actDrop: fc.option(fc.constantFrom(0.01, 0.1, 0.15)),
      retired: fc.boolean(),
    },
    optional,
  ),
  hours: fc.record({ estimated: fc.boolean(), confirms: ids }, optional),
  check: fc.record(
    {
      syringe: fc.option(syringe),
      runs: fc.array(run, { minLength: 1, maxLength: 5 }),
      oilTempC: fc.integer({ min: -40, max: 150 }),
      closedOut: fc.boolean(),
      estimatedHours: fc.boolean(),
    },
    { requiredKeys: ["syringe", "runs", "closedOut"] },
  ),
  work: fc.record({
    items: fc.uniqueArray(fc.constantFrom(...workItems), { minLength: 1 }),
    startsSeries: fc.boolean(),
  }),
  meter: fc.record({ newReading: hours }),
  topup: fc.record({ oilMl: decimals(900) }),
  note: fc.record({ text: fc.constant("A note"), advice: fc.constantFrom(...actions) }),
  strike: fc.record({ entryId: ids, reason: fc.constant("Mistyped") }),
};

const hoursOf = {
  bike: fc.option(hours),
  hours,
  check: hours,
  work: hours,
  meter: fc.option(hours),
  topup: fc.option(hours),
  note: fc.option(hours),
  strike: fc.constant(null),
};

const author = fc.constantFrom(undefined, { id: OWNER, name: "O" }, { id: "m", name: "M" });

const entryOf = (kind: keyof typeof bodies) =>
  fc
    .record({
      id: ids,
      at: instants,
      hours: hoursOf[kind] as fc.Arbitrary<number | null>,
      body: bodies[kind] as fc.Arbitrary<object>,
      receivedAt: fc.option(instants, { nil: undefined }),
      author,
    })
    .filter(({ body }) => {
      const check = body as { syringe?: { capacityMl: number } | null; runs?: object[] };
      const highest = (check.syringe?.capacityMl ?? Infinity) * 1.1;
      return (check.runs ?? []).every((one) => !("endMl" in one) || Number(one.endMl) <= highest);
    })
    .map(({ receivedAt, author: by, ...rest }): LogEntry => {
      const entry = entrySchema.parse({ ...rest, kind, bikeId: BIKE, v: 1 });
      return {
        ...entry,
        ...(receivedAt ? { receivedAt } : {}),
        ...(by ? { author: by } : {}),
      };
    });

const kinds = Object.keys(bodies) as (keyof typeof bodies)[];

/** A likely logbook of one bike, ids unique and often told of; checks are the most frequent. */
export const arbitraryLogbook = fc.uniqueArray(
  fc.oneof(
    { weight: 6, arbitrary: entryOf("check") },
    ...kinds.map((kind) => ({ weight: 1, arbitrary: entryOf(kind) })),
  ),
  { selector: (entry) => entry.id, maxLength: 30 },
);

const takenBySchema = (kind: keyof typeof bodies) =>
  arbitraryOf(entrySchema.options.find(({ shape }) => shape.kind.value === kind)!).filter(
    (entry): entry is LogEntry => entrySchema.safeParse(entry).success,
  );

/** Any logbook of one bike that the schema takes, however unlikely. */
export const schemaLogbook = fc
  .array(
    fc.oneof(
      { weight: 8, arbitrary: takenBySchema("check") },
      ...kinds.map((kind) => ({ weight: 1, arbitrary: takenBySchema(kind) })),
    ),
    { maxLength: 10 },
  )
  .map((entries) => entries.map((entry) => ({ ...entry, bikeId: BIKE })));
