import type { MeterFormat, MeterKind, Rhythm, Sequence } from "../../../shared/schemas/entry.ts";
import type { NewEntry } from "../../offline/index.ts";
import { parseDecimal } from "../../ui/parse-decimal.ts";
import { parseHours } from "../../ui/parse-hours.ts";
import { FieldErrors } from "../../ui/use-submit.ts";
import { usualSequences, type UsualSequenceId } from "../../../shared/delivery/usual-sequences.ts";

export type Known = "yes" | "no" | "unknown";

/** The form as it was filled in: numbers are text until it is saved. */
export interface NewBikeForm {
  name: string;
  make: string;
  model: string;
  year: string;
  meter: MeterKind;
  meterFormat: MeterFormat;
  hours: string;
  screen: Known;
  /** Empty for the usual interval. */
  interval: string;
  sequence: UsualSequenceId | "own" | "unknown";
  ownSeconds: string;
  ownRhythm: Rhythm;
  ownMl: string;
}

export const emptyForm: NewBikeForm = {
  name: "",
  make: "",
  model: "",
  year: "",
  meter: "engine",
  meterFormat: "decimal",
  hours: "",
  screen: "unknown",
  interval: "",
  sequence: "unknown",
  ownSeconds: "",
  ownRhythm: "steady",
  ownMl: "",
};

/** Engine hours between checks: common practice, by whether a screen stands ahead of the pump. */
export const usualIntervalHours = (screen: Known) => (screen === "yes" ? 40 : 20);

const known = { yes: true, no: false, unknown: null };

/**
 * The entry that registers a bike. Numbers that cannot be read are told by field, under the names
 * the entry's own errors have; the schema judges the rest on saving.
 */
export function newBikeEntry(form: NewBikeForm, bikeId: string, at: string): NewEntry {
  const errors: Record<string, string> = {};
  const read = (text: string, field: string, parse = parseDecimal): number | null => {
    const number = parse(text);
    if (number === null && text.trim() !== "") errors[field] = "This is not a number.";
    return number;
  };
  const words = (text: string) => text.trim() || null;
  const name = words(form.name);
  if (!name) errors["body.name"] = "Give the bike a name, so that you know it in the Shed.";

  const entry: NewEntry = {
    bikeId,
    kind: "bike",
    at,
    hours: read(form.hours === ":" ? "" : form.hours, "hours", parseHours),
    body: {
      name: name ?? "",
      make: words(form.make),
      model: words(form.model),
      year: read(form.year, "body.year"),
      meter: form.meter,
      meterFormat: form.meterFormat,
      hasScreen: known[form.screen],
      intervalHours: read(form.interval, "body.intervalHours"),
      sequence: sequenceOf(form, read, errors),
    },
  };
  if (Object.keys(errors).length > 0) throw new FieldErrors(errors);
  return entry;
}

function sequenceOf(
  form: NewBikeForm,
  read: (text: string, field: string) => number | null,
  errors: Record<string, string>,
): Sequence | null {
  if (form.sequence === "unknown") return null;
  if (form.sequence !== "own") {
    const { seconds, rhythm, nominalMl } = usualSequences.find(({ id }) => id === form.sequence)!;
    return { seconds, rhythm, nominalMl };
  }
  const seconds = read(form.ownSeconds, "body.sequence.seconds");
  if (form.ownSeconds.trim() === "")
    errors["body.sequence.seconds"] = "Say how many seconds the sequence runs.";
  const nominalMl = read(form.ownMl, "body.sequence.nominalMl");
  return { seconds: seconds ?? 0, rhythm: form.ownRhythm, nominalMl };
}
