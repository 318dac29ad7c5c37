import type { Sequence } from "../schemas/entry.ts";
import { usualSequences } from "./usual-sequences.ts";

/** What the sequence usually delivers, mL; null where it is not one of the usual kinds. */
export function usualDeliveryMl(sequence: Sequence | null): number | null {
  if (!sequence) return null;
  const usual = usualSequences.find(
    (one) => one.seconds === sequence.seconds && one.rhythm === sequence.rhythm,
  );
  return sequence.nominalMl ?? usual?.nominalMl ?? null;
}
