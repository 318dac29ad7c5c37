import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { parseHours } from "../../../ui/parse-hours.ts";
import type { CheckDraft } from "./check-draft-schema.ts";

type Fields = Pick<CheckDraft, "hoursText" | "oilTempText">;

/** What a check's hours and temperature lack as typed, a sentence a field. */
export function typedErrors({ hoursText, oilTempText }: Fields): Record<string, string> {
  const errors: Record<string, string> = {};
  const hours = parseHours(hoursText);
  if (hours === null) errors.hours = "Type the engine hours as the meter shows them.";
  else if (hours < 0) errors.hours = "Engine hours cannot be negative.";
  if (oilTempText.trim() && parseDecimal(oilTempText) === null)
    errors.oilTemp = "Type the oil’s temperature in figures, or leave it empty.";
  return errors;
}

/** What must be known before the first run. */
export function setUpErrors(draft: CheckDraft): Record<string, string> {
  const errors = typedErrors(draft);
  if (!draft.syringe) errors.syringe = "Choose the syringe you read from.";
  return errors;
}
