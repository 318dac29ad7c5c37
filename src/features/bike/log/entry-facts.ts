import type {
  BikePatch,
  CheckBody,
  LogEntry,
  MeterFormat,
  Run,
} from "../../../../shared/schemas/entry.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatMl, formatTemperature } from "../../../ui/format-quantity.ts";
import { sequenceWords } from "../../../ui/sequence-words.ts";
import { spoilerWords } from "../../../ui/spoiler-words.ts";
import { actionWords } from "../../../ui/words.ts";
import { percentText } from "../percent-text.ts";
import { workWords } from "../../../ui/work-words.ts";

const sentence = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);
const present = (...facts: (string | false | null | undefined)[]) =>
  facts.filter((fact): fact is string => Boolean(fact));

/** What an entry says, fact by fact, but for its hours and its note. */
export function entryFacts(entry: LogEntry, meterFormat: MeterFormat): string[] {
  const hours = (value: number) => `${formatHours(value, meterFormat)}\u00a0h`;
  switch (entry.kind) {
    case "bike":
      return patchFacts(entry.body);
    case "hours":
      return present(
        entry.body.estimated && "An estimate",
        entry.body.confirms && "Confirms an earlier reading",
      );
    case "check":
      return checkFacts(entry.body);
    case "work":
      return [
        ...entry.body.items.map((item) => workWords[item]),
        ...present(entry.body.startsSeries && "Starts a new baseline"),
      ];
    case "meter":
      return [
        entry.hours === null
          ? "The old meter could not be read"
          : `The old meter showed ${hours(entry.hours)}`,
        `The new one starts at ${hours(entry.body.newReading)}`,
      ];
    case "topup": {
      const { oilMl, oilFull, fuelL, fuelFull } = entry.body;
      return present(
        topupWords("Oil", oilMl, "mL", oilFull),
        topupWords("Fuel", fuelL, "L", fuelFull),
      );
    }
    case "note":
      return present(entry.body.advice && `Advice: ${actionWords[entry.body.advice]}`);
    case "strike":
      return [];
  }
}

function topupWords(what: string, volume: number | undefined, unit: string, full = false) {
  if (volume === undefined) return full && `${what} filled up`;
  return `${what} ${volume}\u00a0${unit}${full ? ", filled up" : ""}`;
}

function runWords(run: Run): string {
  const volume =
    "deliveredMl" in run
      ? formatMl(run.deliveredMl)
      : `${run.startMl.toFixed(2)} to ${formatMl(run.endMl)}`;
  const seconds = "seconds" in run && run.seconds !== undefined && `${run.seconds}\u00a0s`;
  return present(volume, seconds, run.void && "void").join(", ");
}

function checkFacts(body: CheckBody): string[] {
  const { syringe, runs, oilTempC, spoilers = [], closedOut, estimatedHours } = body;
  return present(
    ...runs.map((run, index) => `Run ${index + 1}: ${runWords(run)}`),
    syringe ? `${syringe.label}, ${syringe.graduationMl}\u00a0mL marks` : "Syringe not known",
    oilTempC !== undefined && `Oil at ${formatTemperature(oilTempC)}`,
    spoilers.length > 0 && sentence(spoilers.map((spoiler) => spoilerWords[spoiler]).join(", ")),
    estimatedHours && "Hours estimated",
    !closedOut && "Not closed out",
  );
}

const meterKindWords = {
  engine: "meter counts engine hours",
  ignition: "meter counts ignition hours",
  estimated: "no meter, hours estimated",
};

/** What a patch of the bike's details says. Null means "the usual", or "not known". */
export function patchFacts(patch: BikePatch): string[] {
  const { name, make, model, year, meter, meterFormat, intervalHours, hasScreen } = patch;
  const { sequence, watchDrop, actDrop, retired } = patch;
  const named = (what: string, value: string | number | null | undefined) =>
    value !== undefined && `${what}: ${value ?? "none"}`;
  const limit = (what: string, drop: number | null | undefined) =>
    drop !== undefined &&
    `${what}: ${drop === null ? "the usual" : `${percentText(drop)}\u00a0% under the baseline`}`;
  return present(
    named("Name", name),
    named("Make", make),
    named("Model", model),
    named("Year", year),
    meter && sentence(meterKindWords[meter]),
    meterFormat && `Meter shows ${meterFormat === "decimal" ? "12.5" : "12:30"}`,
    intervalHours !== undefined &&
      `Interval: ${intervalHours === null ? "the usual" : `${intervalHours}\u00a0h`}`,
    hasScreen !== undefined && `Screen: ${screenWords(hasScreen)}`,
    sequence !== undefined && `Sequence: ${sequence ? sequenceWords(sequence) : "not known"}`,
    limit("Delivery dropping from", watchDrop),
    limit("Delivery low from", actDrop),
    retired !== undefined && (retired ? "Retired" : "Brought back"),
  );
}

const screenWords = (hasScreen: boolean | null) =>
  hasScreen === null ? "not known" : hasScreen ? "yes" : "no";
