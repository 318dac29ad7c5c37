import { identifySequence } from "../../../../shared/delivery/identify-sequence.ts";
import { usualSequences } from "../../../../shared/delivery/usual-sequences.ts";
import type { Sequence } from "../../../../shared/schemas/entry.ts";
import type { RunDraft } from "./check-draft-schema.ts";

/** A usual kind of sequence as a bike keeps it. */
export const asSequence = ({ seconds, rhythm, nominalMl }: (typeof usualSequences)[number]) =>
  ({ seconds, rhythm, nominalMl }) satisfies Sequence;

/**
 * The sequences that a first run may have been, likeliest first, for the rider to confirm: the usual
 * kind it resembles, and the run itself. Null until its length and rhythm are known.
 */
export function proposeSequences(run: RunDraft): { usual: Sequence | null; own: Sequence } | null {
  const { seconds, rhythm } = run;
  if (seconds === null || rhythm === null) return null;
  const kind = identifySequence({ seconds, rhythm });
  const usual = usualSequences.find(({ id }) => id === kind);
  return {
    usual: usual ? asSequence(usual) : null,
    own: { seconds: Math.max(1, Math.round(seconds)), rhythm, nominalMl: null },
  };
}
