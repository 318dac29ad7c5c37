import type { Sequence } from "../schemas/entry.ts";
import { usualSequences } from "./usual-sequences.ts";

/**
 * What a sequence usually delivers in one run.
 *
 * Formula: the bike's own figure where it has one, else that of the usual sequence of the same length
 * and rhythm. Units: seconds → mL. Source: common practice of the trade, no published source.
 * Edges: null where the sequence is not known, or is none of the usual ones and has no figure.
 *
 * @example usualDeliveryMl({ seconds: 30, rhythm: "steady", nominalMl: null }) // 3
 */
export function usualDeliveryMl(sequence: Sequence | null): number | null {
  if (!sequence) return null;
  const usual = usualSequences.find(
    (one) => one.seconds === sequence.seconds && one.rhythm === sequence.rhythm,
  );
  return sequence.nominalMl ?? usual?.nominalMl ?? null;
}
