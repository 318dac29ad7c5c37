/**
 * The entries of a bike's logbook, as phones make them and the server stores them.
 * Nothing here changes what it parses (no trimming, no defaults), so that the phone's
 * copy and the server's copy of an entry are the same to the letter.
 */
import { z } from "zod";

export const ENTRY_VERSION = 1;
export const MAX_HOURS = 100_000;
export const MAX_NOTE_LENGTH = 2_000;
export const MAX_RUNS = 30;
export const MAX_ENTRIES_PER_BIKE = 10_000;
/** A level may be this much over the barrel's capacity (the plunger pulled past the last mark). */
export const MAX_OVERFILL = 1.1;
/** The usual limits; a bike's own may only be tighter. */
export const USUAL_WATCH_DROP = 0.08;
export const USUAL_ACT_DROP = 0.15;

const idSchema = z
  .uuid("This id is not a UUID.")
  .regex(/^[^A-Z]*$/, "Ids are written in lower case.");

const instantSchema = z.iso
  .datetime({ offset: true, error: "This is not a date and time in ISO 8601." })
  .refine((text) => Number.isFinite(Date.parse(text)), "There is no such date.");

const text = (max: number, what: string) =>
  z
    .string(`${what} must be text.`)
    .max(max, `${what} is too long: at most ${max.toLocaleString("en")} characters.`)
    .regex(/\S/, `${what} is empty.`);

const quantity = (what: string, unit: string, max: number) =>
  z
    .number(`${what} must be a number of ${unit}.`)
    .min(0, `${what} cannot be negative.`)
    .max(max, `${what} is beyond ${max.toLocaleString("en")} ${unit}.`);

const hoursSchema = quantity("Engine hours", "hours", MAX_HOURS);
const noteSchema = text(MAX_NOTE_LENGTH, "The note");

export const meterKinds = ["engine", "ignition", "estimated"] as const;
export const meterFormats = ["decimal", "hh:mm"] as const;
export const rhythms = ["steady", "alternating"] as const;
export const verdicts = ["none", "settling", "holding", "dropping", "low"] as const;
export const actions = ["ride", "repeat", "stop"] as const;
export const workItems = [
  "pump-renewed",
  "pump-cleaned",
  "screen-cleaned",
  "hose-renewed",
  "line-bled",
  "controller-updated",
  "oil-changed",
  "other",
] as const;
export const spoilers = [
  "hose-in-oil",
  "barrel-not-upright",
  "tip-leaked",
  "eye-off-level",
  "oil-film",
  "bubbles",
  "cold-oil",
  "weak-battery",
  "low-tank",
  "drip-wait-varied",
] as const;

export const sequenceSchema = z.strictObject({
  seconds: z
    .number("The sequence's length must be a number of seconds.")
    .positive("The sequence's length must be above zero.")
    .max(600, "The sequence's length is beyond 600 seconds."),
  rhythm: z.enum(rhythms, "The rhythm is steady or alternating."),
  nominalMl: z
    .number("The usual delivery must be a number of mL.")
    .positive("The usual delivery must be above zero.")
    .max(100, "The usual delivery is beyond 100 mL.")
    .nullable(),
});

export const syringeSchema = z
  .strictObject({
    id: z
      .string("The syringe needs an id.")
      .min(1, "The syringe needs an id.")
      .max(64, "The syringe's id is too long."),
    label: text(60, "The syringe's label"),
    capacityMl: z
      .number("Capacity must be a number of mL.")
      .positive("Capacity must be above zero.")
      .max(200, "Capacity is beyond 200 mL."),
    graduationMl: z
      .number("Graduation must be a number of mL.")
      .positive("Graduation must be above zero."),
  })
  .refine((syringe) => syringe.graduationMl <= syringe.capacityMl / 2, {
    path: ["graduationMl"],
    error: "One graduation is the step between two marks: at most half the capacity.",
  })
  .refine((syringe) => syringe.graduationMl >= syringe.capacityMl / 1000, {
    path: ["graduationMl"],
    error: "No barrel has marks that fine.",
  });

const levelSchema = quantity("A level", "mL", 1_000);

export const levelRunSchema = z
  .strictObject({
    startMl: levelSchema,
    endMl: levelSchema,
    seconds: quantity("A run's length", "seconds", 3_600).optional(),
    rhythm: z.enum(rhythms, "The rhythm is steady or alternating.").optional(),
    pulses: z
      .int("Pulses are counted in whole numbers.")
      .min(0, "Pulses cannot be negative.")
      .max(100_000, "Pulses are beyond 100,000.")
      .optional(),
    void: z.boolean().optional(),
  })
  .refine((run) => run.endMl >= run.startMl, {
    path: ["endMl"],
    error: "The end level is below the start level.",
  });

export const volumeRunSchema = z.strictObject({
  deliveredMl: quantity("A delivered volume", "mL", 1_000),
  void: z.boolean().optional(),
});

export const runSchema = z.union([levelRunSchema, volumeRunSchema]);

const bikePatchSchema = z.strictObject({
  name: text(80, "The bike's name").optional(),
  make: text(60, "The make").nullable().optional(),
  model: text(60, "The model").nullable().optional(),
  year: z
    .int("The year must be a whole number.")
    .min(1900, "The year is before 1900.")
    .max(2200, "The year is beyond 2200.")
    .nullable()
    .optional(),
  meter: z.enum(meterKinds, "The hour meter is engine, ignition or estimated.").optional(),
  meterFormat: z.enum(meterFormats, "The meter shows decimal hours or hh:mm.").optional(),
  intervalHours: z
    .number("The interval must be a number of hours.")
    .min(1, "The interval must be at least 1 hour.")
    .max(1_000, "The interval is beyond 1,000 hours.")
    .nullable()
    .optional(),
  hasScreen: z.boolean("The screen is there, not there, or not known.").nullable().optional(),
  sequence: sequenceSchema.nullable().optional(),
  watchDrop: z
    .number("The watch limit must be a fraction.")
    .min(0.01, "A limit closer than 1 % is finer than any syringe.")
    .max(USUAL_WATCH_DROP, "This limit can be tightened, not loosened: at most 8 %.")
    .nullable()
    .optional(),
  actDrop: z
    .number("The stop limit must be a fraction.")
    .min(0.01, "A limit closer than 1 % is finer than any syringe.")
    .max(USUAL_ACT_DROP, "This limit can be tightened, not loosened: at most 15 %.")
    .nullable()
    .optional(),
  retired: z.boolean("A bike is retired or not.").optional(),
});

const checkBodySchema = z
  .strictObject({
    syringe: syringeSchema.nullable(),
    runs: z
      .array(runSchema, "A check holds a list of runs.")
      .min(1, "A check holds at least one run.")
      .max(MAX_RUNS, `A check holds at most ${MAX_RUNS} runs.`),
    oilTempC: z
      .number("The oil's temperature must be a number of °C.")
      .min(-40, "The oil's temperature is below −40 °C.")
      .max(150, "The oil's temperature is beyond 150 °C.")
      .optional(),
    spoilers: z.array(z.enum(spoilers, "This is not a known spoiler.")).max(20).optional(),
    closedOut: z.boolean("Say whether the check was closed out."),
    estimatedHours: z.boolean().optional(),
    note: noteSchema.optional(),
  })
  .superRefine((body, context) => {
    if (!body.syringe) return;
    const highest = body.syringe.capacityMl * MAX_OVERFILL;
    body.runs.forEach((run, index) => {
      const levels = "endMl" in run ? { startMl: run.startMl, endMl: run.endMl } : {};
      for (const [name, level] of Object.entries(levels)) {
        if (level > highest)
          context.addIssue({
            code: "custom",
            path: ["runs", index, name],
            message: `This level is far beyond the ${body.syringe?.capacityMl} mL barrel.`,
          });
      }
    });
  });

const bodies = {
  bike: bikePatchSchema,
  hours: z.strictObject({
    estimated: z.boolean().optional(),
    confirms: idSchema.optional(),
    note: noteSchema.optional(),
  }),
  check: checkBodySchema,
  work: z.strictObject({
    items: z
      .array(z.enum(workItems, "This is not a known kind of work."))
      .min(1, "Say what was done.")
      .max(workItems.length, "Each kind of work is named once."),
    startsSeries: z.boolean("Say whether this starts a new baseline."),
    note: noteSchema.optional(),
  }),
  meter: z.strictObject({ newReading: hoursSchema }),
  topup: z
    .strictObject({
      oilMl: quantity("Oil", "mL", 100_000).optional(),
      oilFull: z.boolean().optional(),
      fuelL: quantity("Fuel", "litres", 10_000).optional(),
      fuelFull: z.boolean().optional(),
    })
    .refine((body) => Object.values(body).some((value) => value !== undefined), {
      path: ["oilMl"],
      error: "Say how much oil or fuel went in.",
    }),
  note: z.strictObject({
    text: noteSchema,
    advice: z.enum(actions, "Advice is ride, repeat or stop.").optional(),
  }),
  strike: z.strictObject({ entryId: idSchema, reason: text(500, "The reason") }),
};

const envelope = {
  id: idSchema,
  bikeId: idSchema,
  v: z.literal(ENTRY_VERSION, "This entry was written by another version of the app."),
  at: instantSchema,
};
const optionalHours = hoursSchema.nullable();

export const entrySchema = z.discriminatedUnion(
  "kind",
  [
    z.strictObject({
      ...envelope,
      kind: z.literal("bike"),
      hours: optionalHours,
      body: bodies.bike,
    }),
    z.strictObject({
      ...envelope,
      kind: z.literal("hours"),
      hours: hoursSchema,
      body: bodies.hours,
    }),
    z.strictObject({
      ...envelope,
      kind: z.literal("check"),
      hours: hoursSchema,
      body: bodies.check,
    }),
    z.strictObject({ ...envelope, kind: z.literal("work"), hours: hoursSchema, body: bodies.work }),
    z.strictObject({
      ...envelope,
      kind: z.literal("meter"),
      hours: optionalHours,
      body: bodies.meter,
    }),
    z.strictObject({
      ...envelope,
      kind: z.literal("topup"),
      hours: optionalHours,
      body: bodies.topup,
    }),
    z.strictObject({
      ...envelope,
      kind: z.literal("note"),
      hours: optionalHours,
      body: bodies.note,
    }),
    z.strictObject({
      ...envelope,
      kind: z.literal("strike"),
      hours: z.null("A strike carries no hours."),
      body: bodies.strike,
    }),
  ],
  {
    error: (issue) =>
      issue.code === "invalid_union"
        ? "An entry must be of a known kind."
        : "An entry must be an object with its fields.",
  },
);

export const entryKinds = Object.keys(bodies) as EntryKind[];

/** What every entry has, whatever its kind and version: enough to keep one that we do not understand. */
export const envelopeSchema = z.looseObject({
  id: idSchema,
  bikeId: idSchema,
  kind: z.string().min(1).max(40),
  v: z.int().min(1),
  at: instantSchema,
});

/** What the server adds to an entry when it stores it. */
export const receiptSchema = z.object({
  author: z.object({ id: z.string(), name: z.string() }),
  receivedAt: instantSchema,
  rev: z.int().positive(),
});

/** An entry as the server sends it: perhaps of a kind or version that only a newer app knows. */
export const storedEntrySchema = envelopeSchema.extend(receiptSchema.shape);

export type EntryKind = keyof typeof bodies;
export type Entry = z.infer<typeof entrySchema>;
export type EntryOf<K extends EntryKind> = Extract<Entry, { kind: K }>;
export type EntryBody<K extends EntryKind> = EntryOf<K>["body"];
export type EntryEnvelope = z.infer<typeof envelopeSchema>;
export type Receipt = z.infer<typeof receiptSchema>;
export type StoredEntry = z.infer<typeof storedEntrySchema>;
/** An entry as the logbook reads it: the receipt is missing until the server has it. */
export type LogEntry = Entry & Partial<Receipt>;
export type LogEntryOf<K extends EntryKind> = EntryOf<K> & Partial<Receipt>;

export type Syringe = z.infer<typeof syringeSchema>;
export type Sequence = z.infer<typeof sequenceSchema>;
export type Run = z.infer<typeof runSchema>;
export type CheckBody = z.infer<typeof checkBodySchema>;
export type BikePatch = z.infer<typeof bikePatchSchema>;
export type Rhythm = (typeof rhythms)[number];
export type Verdict = (typeof verdicts)[number];
export type Action = (typeof actions)[number];
export type WorkItem = (typeof workItems)[number];
export type Spoiler = (typeof spoilers)[number];
export type MeterKind = (typeof meterKinds)[number];
export type MeterFormat = (typeof meterFormats)[number];
