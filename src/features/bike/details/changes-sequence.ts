import type { BikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { usualSequences } from "../../../../shared/delivery/usual-sequences.ts";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import type { DetailsForm } from "./details-patch.ts";

type Chosen = Pick<DetailsForm, "sequence" | "ownSeconds" | "ownRhythm">;

/** Whether a form goes from one known sequence to another: what it usually delivers is no part of it. */
export function changesSequence(
  { sequence }: Pick<BikeDetails, "sequence">,
  form: Chosen,
): boolean {
  if (!sequence || form.sequence === "unknown") return false;
  const usual = usualSequences.find(({ id }) => id === form.sequence);
  const seconds = usual?.seconds ?? parseDecimal(form.ownSeconds);
  const rhythm = usual?.rhythm ?? form.ownRhythm;
  return seconds !== null && (seconds !== sequence.seconds || rhythm !== sequence.rhythm);
}
