import {
  USUAL_ACT_DROP,
  USUAL_WATCH_DROP,
  type BikePatch,
  type LogEntry,
  type MeterFormat,
  type MeterKind,
  type Sequence,
} from "../schemas/entry.ts";

/** A bike as its `bike` entries leave it, with the usual values where none was given. */
export interface BikeDetails {
  name: string;
  make: string | null;
  model: string | null;
  year: number | null;
  meter: MeterKind;
  meterFormat: MeterFormat;
  /** The bike's own interval, engine hours; null for the usual one. */
  intervalHours: number | null;
  /** Whether a screen stands ahead of the pump; null where not known. */
  hasScreen: boolean | null;
  sequence: Sequence | null;
  /** Limits as drops from the baseline, fractions. */
  watchDrop: number;
  actDrop: number;
  retired: boolean;
}

const unpatched: BikeDetails = {
  name: "",
  make: null,
  model: null,
  year: null,
  meter: "engine",
  meterFormat: "decimal",
  intervalHours: null,
  hasScreen: null,
  sequence: null,
  watchDrop: USUAL_WATCH_DROP,
  actDrop: USUAL_ACT_DROP,
  retired: false,
};

/** `details` with a patch applied: a field that the patch names wins, null meaning "the usual". */
function patched(details: BikeDetails, patch: BikePatch): BikeDetails {
  const named = Object.entries(patch).filter(([, value]) => value !== undefined);
  return { ...details, ...Object.fromEntries(named) };
}

/**
 * The details after all `bike` entries of a logbook, given in effective order. Limits come out no
 * looser than the usual ones, the watch limit no further than the stop limit.
 */
export function bikeDetails(standing: readonly LogEntry[]): BikeDetails {
  const details = standing.reduce(
    (soFar, entry) => (entry.kind === "bike" ? patched(soFar, entry.body) : soFar),
    unpatched,
  );
  const actDrop = Math.min(details.actDrop ?? USUAL_ACT_DROP, USUAL_ACT_DROP);
  const watchDrop = Math.min(details.watchDrop ?? USUAL_WATCH_DROP, actDrop);
  return { ...details, actDrop, watchDrop };
}
