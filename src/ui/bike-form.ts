import { usualSequences, type UsualSequenceId } from "../../shared/delivery/usual-sequences.ts";
import type { BikeDetails } from "../../shared/logbook/bike-details.ts";
import type {
  BikePatch,
  MeterFormat,
  MeterKind,
  Rhythm,
  Sequence,
} from "../../shared/schemas/entry.ts";
import { parseDecimal } from "./parse-decimal.ts";
import { FieldErrors } from "./use-submit.ts";

export type Known = "yes" | "no" | "unknown";

/** What a bike is, as a form holds it: numbers are text until it is saved. */
export interface BikeForm {
  name: string;
  make: string;
  model: string;
  year: string;
  meter: MeterKind;
  meterFormat: MeterFormat;
  screen: Known;
  /** Empty for the usual interval. */
  interval: string;
  sequence: UsualSequenceId | "own" | "unknown";
  ownSeconds: string;
  ownRhythm: Rhythm;
  ownMl: string;
}

/** What the fields of such a form are given. */
export interface BikeFormPart {
  form: BikeForm;
  set: (change: Partial<BikeForm>) => void;
  /** By the names that the entry's own errors have: `body.year`. */
  errors: Record<string, string>;
}

export const emptyBikeForm: BikeForm = {
  name: "",
  make: "",
  model: "",
  year: "",
  meter: "engine",
  meterFormat: "decimal",
  screen: "unknown",
  interval: "",
  sequence: "unknown",
  ownSeconds: "",
  ownRhythm: "steady",
  ownMl: "",
};

const asText = (value: string | number | null | undefined) => String(value ?? "");

/** The form as a bike's details fill it in. */
export function bikeFormOf(details: BikeDetails): BikeForm {
  const { sequence, hasScreen } = details;
  return {
    name: details.name,
    make: asText(details.make),
    model: asText(details.model),
    year: asText(details.year),
    meter: details.meter,
    meterFormat: details.meterFormat,
    screen: hasScreen === null ? "unknown" : hasScreen ? "yes" : "no",
    interval: asText(details.intervalHours),
    sequence: sequence ? kindOf(sequence) : "unknown",
    ownSeconds: asText(sequence?.seconds),
    ownRhythm: sequence?.rhythm ?? "steady",
    ownMl: asText(sequence?.nominalMl),
  };
}

function kindOf({ seconds, rhythm, nominalMl }: Sequence): UsualSequenceId | "own" {
  const usual = usualSequences.find(
    (one) => one.seconds === seconds && one.rhythm === rhythm && one.nominalMl === nominalMl,
  );
  return usual?.id ?? "own";
}

const known = { yes: true, no: false, unknown: null };

export type BikeFormValues = Required<Omit<BikePatch, "watchDrop" | "actDrop" | "retired">>;

/**
 * What the form says, as an entry holds it. Numbers that cannot be read are told by field; the
 * schema judges the rest on saving.
 */
export function readBikeForm(form: BikeForm): BikeFormValues {
  const errors: Record<string, string> = {};
  const read = (text: string, field: string): number | null => {
    const number = parseDecimal(text);
    if (number === null && text.trim() !== "") errors[field] = "This is not a number.";
    return number;
  };
  const words = (text: string) => text.trim() || null;
  const name = words(form.name);
  if (!name) errors["body.name"] = "Give the bike a name, so that you know it in the Shed.";

  const values = {
    name: name ?? "",
    make: words(form.make),
    model: words(form.model),
    year: read(form.year, "body.year"),
    meter: form.meter,
    meterFormat: form.meterFormat,
    hasScreen: known[form.screen],
    intervalHours: read(form.interval, "body.intervalHours"),
    sequence: sequenceOf(form, read, errors),
  };
  if (Object.keys(errors).length > 0) throw new FieldErrors(errors);
  return values;
}

function sequenceOf(
  form: BikeForm,
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
