import type { LogEntry } from "../schemas/entry.ts";
import type { DoubtfulReading } from "../schemas/summary.ts";
import { effectiveTime } from "./effective-order.ts";

export const HOUR_MS = 3_600_000;
const WEEK_MS = 7 * 24 * HOUR_MS;
/** Hours a week are taken from the readings of this long before the last one. */
const USE_WINDOW_MS = 8 * WEEK_MS;
/** So many of the latest readings that wait may agree with a new one: more would take long to ask. */
const MOST_HEARD = 100;
/** Meters show tenths: two readings may seem this much further apart than the clock, in hours. */
export const DISPLAY_SLACK_HOURS = 0.2;
/** Differences of added decimals below this are rounding. */
const ROUNDING_HOURS = 1e-6;

export interface Reading {
  entryId: string;
  /** Effective time, ms since 1970. */
  timeMs: number;
  /** Lifetime hours. */
  hours: number;
  estimated: boolean;
}

export interface LifetimeHours {
  /** The last reading that counts, lifetime hours; null where there is none. */
  now: number | null;
  readAtMs: number | null;
  /** Lifetime hours less this is what the meter shows. */
  displayOffset: number;
  /** Hours ridden a week, from the readings of the 8 weeks before the last; null where unknown. */
  perWeek: number | null;
  doubtful: DoubtfulReading[];
  /** Lifetime hours of every entry that carries hours. */
  atHours: ReadonlyMap<string, number>;
}

type Doubt = DoubtfulReading["why"];

/** Why a reading cannot follow an earlier one, if it cannot. */
function doubtAfter(earlier: Reading | undefined, reading: Reading): Doubt | null {
  if (!earlier) return null;
  const gained = reading.hours - earlier.hours;
  if (gained < -ROUNDING_HOURS) return "below-earlier";
  const passed = (reading.timeMs - earlier.timeMs) / HOUR_MS;
  return gained > passed + DISPLAY_SLACK_HOURS ? "faster-than-clock" : null;
}

/** Readings taken in one after another; those that do not fit wait until something confirms them. */
class Readings {
  readonly counted: Reading[] = [];
  waiting: (Reading & { why: Doubt })[] = [];

  /** Takes a reading in; answers whether it counts. */
  take(reading: Reading, confirmed: boolean): boolean {
    const why = confirmed ? null : doubtAfter(this.last(reading.estimated), reading);
    const recent = this.waiting.slice(-MOST_HEARD);
    const agreeing = recent.filter((earlier) => !doubtAfter(earlier, reading));
    if (why && agreeing.length === 0) {
      this.waiting.push({ ...reading, why });
      return false;
    }
    if (agreeing.length > 0)
      this.waiting = this.waiting.filter((earlier) => !agreeing.includes(earlier));
    this.counted.push(...agreeing, reading);
    return true;
  }

  /** The reading to compare with: what a meter showed is not doubted because of an estimate. */
  last(estimated: boolean): Reading | undefined {
    return estimated ? this.counted.at(-1) : this.counted.findLast((earlier) => !earlier.estimated);
  }
}

function isEstimated(entry: LogEntry): boolean {
  if (entry.kind === "hours") return entry.body.estimated === true;
  return entry.kind === "check" && entry.body.estimatedHours === true;
}

/**
 * Engine hours over the bike's whole life, from the readings in its logbook.
 *
 * Formula: lifetime = display + offset; a `meter` entry adds (old last reading − new reading) to the
 * offset, the old meter's last counted reading standing in where it could not be read.
 * A reading below an earlier one, or gaining more hours than passed, is kept and does not count
 * until an `hours` entry confirms it or a later reading agrees with it.
 * Units: hours, ms, hours a week. Input: the standing entries in effective order.
 * Edges: no reading → `now` null; a meter changed before any reading leaves the offset as it is; a
 * reading that would lie below 0 (a new meter's first reading mistyped) is 0; readings under a week
 * apart → `perWeek` null.
 *
 * @example lifetimeHours([hours 12.0 on Monday, hours 320 on Tuesday]) // now 12, one doubtful reading
 */
export function lifetimeHours(standing: readonly LogEntry[]): LifetimeHours {
  const confirmed = new Set(
    standing.flatMap((entry) => (entry.kind === "hours" ? (entry.body.confirms ?? []) : [])),
  );
  const readings = new Readings();
  const atHours = new Map<string, number>();
  let offset = 0;
  for (const entry of standing) {
    const reading: Reading | null =
      entry.hours === null
        ? null
        : {
            entryId: entry.id,
            timeMs: effectiveTime(entry),
            hours: Math.max(0, entry.hours + offset),
            estimated: isEstimated(entry),
          };
    const counts = reading !== null && readings.take(reading, confirmed.has(entry.id));
    if (reading) atHours.set(entry.id, reading.hours);
    if (entry.kind === "meter") {
      const oldMeter = counts ? reading : readings.counted.at(-1);
      if (oldMeter) offset = oldMeter.hours - entry.body.newReading;
    }
  }
  const last = readings.counted.at(-1);
  return {
    now: last?.hours ?? null,
    readAtMs: last?.timeMs ?? null,
    displayOffset: offset,
    perWeek: last ? hoursPerWeek(readings.counted, last) : null,
    doubtful: readings.waiting.map(({ entryId, hours, why }) => ({ entryId, atHours: hours, why })),
    atHours,
  };
}

function hoursPerWeek(counted: readonly Reading[], last: Reading): number | null {
  const first = counted.find((reading) => reading.timeMs >= last.timeMs - USE_WINDOW_MS) ?? last;
  const weeks = (last.timeMs - first.timeMs) / WEEK_MS;
  return weeks >= 1 ? Math.max(0, last.hours - first.hours) / weeks : null;
}
