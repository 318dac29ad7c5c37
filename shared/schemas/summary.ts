/** What `summariseLogbook` answers: all hours are lifetime hours, all volumes mL a run at 15 °C. */
import { z } from "zod";
import { actions, verdicts, workItems } from "./entry.ts";

const flagSchema = z.string();

export const seriesSchema = z.object({
  /** What began it: the bike's first check, work that resets the baseline, or another sequence. */
  startedBy: z.enum(["first-check", "work", "sequence"]),
  /** The entry that began it. */
  entryId: z.string(),
  items: z.array(z.enum(workItems)),
  at: z.string(),
  atHours: z.number().nullable(),
  /** Null until the series has its first session. */
  baseline: z
    .object({
      perRunMl: z.number(),
      uMl: z.number(),
      uScaleMl: z.number(),
      syringeId: z.string().nullable(),
      oilTempC: z.number().nullable(),
      atHours: z.number(),
    })
    .nullable(),
});

export const checkSummarySchema = z.object({
  entryId: z.string(),
  at: z.string(),
  atHours: z.number(),
  /** Index into `series`. */
  series: z.int().min(0),
  perRunMl: z.number(),
  uMl: z.number(),
  uScaleMl: z.number(),
  runsCounted: z.int().positive(),
  /** Null while settling; otherwise of the whole session this check belongs to. */
  ratio: z.number().nullable(),
  uRatio: z.number().nullable(),
  /** The baseline that `ratio` is taken to, mL a run; null where there was none to compare with. */
  baselineMl: z.number().nullable(),
  verdict: z.enum(["settling", "holding", "dropping", "low"]),
  action: z.enum(actions),
  pLow: z.number().nullable(),
  pDropping: z.number().nullable(),
  /** 0 where it is settled; null while settling or where no number of runs will do. */
  runsToSettle: z.int().nullable(),
  flags: z.array(flagSchema),
});

export const trendSchema = z.object({
  /** Change of the delivery, mL a run per engine hour. */
  perHour: z.number(),
  uPerHour: z.number(),
  /** Null unless the delivery is declining. */
  reachesLimitAtHours: z.number().nullable(),
  range: z.object({ low: z.number(), high: z.number() }).nullable(),
});

export const dueSchema = z.object({
  atHours: z.number(),
  inHours: z.number(),
  overdue: z.boolean(),
  /** YYYY-MM-DD (UTC); null where the hours a week are not known. */
  onDate: z.string().nullable(),
  reason: z.string(),
});

export const summarySchema = z.object({
  bikeId: z.string(),
  name: z.string(),
  hours: z.object({
    now: z.number().nullable(),
    readAt: z.string().nullable(),
    /** Lifetime hours less this is what the meter shows. */
    displayOffset: z.number(),
    perWeek: z.number().nullable(),
    /** Readings kept but not counted until the rider confirms them. */
    doubtful: z.array(
      z.object({
        entryId: z.string(),
        atHours: z.number(),
        why: z.enum(["below-earlier", "faster-than-clock"]),
      }),
    ),
  }),
  series: z.array(seriesSchema),
  checks: z.array(checkSummarySchema),
  verdict: z.enum(verdicts),
  action: z.enum(actions).nullable(),
  pLow: z.number().nullable(),
  trend: trendSchema.nullable(),
  due: dueSchema,
  flags: z.array(flagSchema),
});

export type Summary = z.infer<typeof summarySchema>;
export type CheckSummary = z.infer<typeof checkSummarySchema>;
export type SeriesSummary = z.infer<typeof seriesSchema>;
export type Baseline = NonNullable<SeriesSummary["baseline"]>;
export type Trend = z.infer<typeof trendSchema>;
export type Due = z.infer<typeof dueSchema>;
export type DoubtfulReading = Summary["hours"]["doubtful"][number];
