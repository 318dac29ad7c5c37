import type { Rhythm } from "../schemas/entry.ts";
import { usualSequences, type UsualSequenceId } from "./usual-sequences.ts";

/** A run may be this much shorter or longer than the sequence it belongs to. */
const LENGTH_TOLERANCE = 0.2;

export type IdentifiedSequence = UsualSequenceId | "own";

/**
 * Which of the usual priming sequences a run was, as a proposal for the rider to confirm: never
 * taken silently.
 *
 * Formula: the same rhythm, and a length within 20 % of the usual one.
 * Units: seconds.
 * Source: common practice, no published source; the 20 % is the rule by which runs are counted.
 * Edges: anything else is the bike's "own" sequence.
 *
 * @example identifySequence({ seconds: 57, rhythm: "steady" }) // "single-rate-long"
 */
export function identifySequence(run: { seconds: number; rhythm: Rhythm }): IdentifiedSequence {
  const usual = usualSequences.find(
    ({ seconds, rhythm }) =>
      rhythm === run.rhythm && Math.abs(run.seconds - seconds) <= LENGTH_TOLERANCE * seconds,
  );
  return usual?.id ?? "own";
}
