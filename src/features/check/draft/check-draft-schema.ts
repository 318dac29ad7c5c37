/**
 * A guided check half done, as it stands in the phone's store. Numbers are kept as they were typed.
 */
import { z } from "zod";
import {
  rhythms,
  sequenceSchema,
  spoilers,
  syringeSchema,
} from "../../../../shared/schemas/entry.ts";

/** Why a run does not count. */
export const voidReasons = ["not-started", "interrupted", "doubled"] as const;

export const closeOutItems = [
  "test-lead-out",
  "hose-clipped",
  "line-primed",
  "no-leaks",
  "smoke-as-usual",
] as const;

const runDraftSchema = z.object({
  /** Null where the run goes on from where the one before ended. */
  startText: z.string().nullable(),
  endText: z.string(),
  /** The instant the timer was started; null before, and where the timer was not used. */
  startedAt: z.string().nullable(),
  /** How long the pump ticked, where that is not the sequence's length. */
  seconds: z.number().nullable(),
  rhythm: z.enum(rhythms).nullable(),
  voided: z.enum(voidReasons).nullable(),
});

export const checkDraftSchema = z.object({
  at: z.string(),
  hoursText: z.string(),
  estimatedHours: z.boolean(),
  oilTempText: z.string(),
  syringe: syringeSchema.nullable(),
  /** For a bike whose sequence is not known: the one chosen or found out here. */
  sequence: sequenceSchema.nullable(),
  spoilers: z.array(z.enum(spoilers)),
  runs: z.array(runDraftSchema),
  closeOut: z.array(z.enum(closeOutItems)),
  note: z.string(),
  /** What the Shed warns of; it outlives an abandoned check. */
  hoseMaybeOff: z.boolean(),
});

export type RunDraft = z.infer<typeof runDraftSchema>;
export type CheckDraft = z.infer<typeof checkDraftSchema>;
export type VoidReason = (typeof voidReasons)[number];
export type CloseOutItem = (typeof closeOutItems)[number];
