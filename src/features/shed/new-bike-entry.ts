import type { NewEntry } from "../../offline/index.ts";
import { emptyBikeForm, readBikeForm, type BikeForm } from "../../ui/bike-form.ts";
import { parseHours } from "../../ui/parse-hours.ts";

export interface NewBikeForm extends BikeForm {
  /** What the meter shows now; may be empty. */
  hours: string;
}

export const emptyForm: NewBikeForm = { ...emptyBikeForm, hours: "" };

/** The entry that registers a bike. Hours that cannot be read are for the schema to tell. */
export function newBikeEntry(form: NewBikeForm, bikeId: string, at: string): NewEntry {
  const { hours: text, ...bike } = form;
  const hours = text.replace(":", "").trim() === "" ? null : (parseHours(text) ?? NaN);
  return { bikeId, kind: "bike", at, hours, body: readBikeForm(bike) };
}
