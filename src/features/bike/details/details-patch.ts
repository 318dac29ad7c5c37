import type { BikeDetails } from "../../../../shared/logbook/bike-details.ts";
import type { BikePatch } from "../../../../shared/schemas/entry.ts";
import { bikeFormOf, readBikeForm, type BikeForm } from "../../../ui/bike-form.ts";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { percentText } from "../percent-text.ts";

/** The bike's form with its limits, which only a bike in use has reason to tighten. */
export interface DetailsForm extends BikeForm {
  /** Drops from the baseline, percent. */
  watchPercent: string;
  actPercent: string;
}

export function detailsFormOf(details: BikeDetails): DetailsForm {
  return {
    ...bikeFormOf(details),
    watchPercent: percentText(details.watchDrop),
    actPercent: percentText(details.actDrop),
  };
}

/** NaN where it is no number: the schema then names the field. */
const dropOf = (percent: string) => Number(((parseDecimal(percent) ?? NaN) / 100).toFixed(4));

const isSame = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/** What a form changes in the details: the fields that differ, and no others. */
export function detailsPatch(details: BikeDetails, form: DetailsForm): BikePatch {
  const { watchPercent, actPercent, ...bike } = form;
  const next = {
    ...readBikeForm(bike),
    watchDrop: dropOf(watchPercent),
    actDrop: dropOf(actPercent),
  };
  const changed = Object.entries(next).filter(
    ([field, value]) => !isSame(value, details[field as keyof BikeDetails]),
  );
  return Object.fromEntries(changed);
}
