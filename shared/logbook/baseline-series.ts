import type { FlagCode } from "../delivery/flags.ts";
import { measureDelivery, type Delivery } from "../delivery/measure-delivery.ts";
import type { LogEntry, LogEntryOf, Sequence, WorkItem } from "../schemas/entry.ts";
import type { SeriesSummary } from "../schemas/summary.ts";
import { effectiveTime } from "./effective-order.ts";
import type { LifetimeHours } from "./lifetime-hours.ts";

/** Checks this close to the first of them, engine hours, are one session. */
export const SESSION_HOURS = 1;
/** Work after which another delivery is to be expected: the old baseline says nothing any more. */
const RESETTING_WORK: readonly WorkItem[] = ["pump-renewed", "controller-updated"];

/** A check that could be counted. */
export interface MeasuredCheck {
  entry: LogEntryOf<"check">;
  timeMs: number;
  /** Lifetime hours. */
  atHours: number;
  /** False where the hour reading is still doubted. */
  hoursCount: boolean;
  delivery: Delivery;
  /** The bike's sequence at the time. */
  sequence: Sequence | null;
  flags: FlagCode[];
}

export type Session = readonly [MeasuredCheck, ...MeasuredCheck[]];

export interface Series {
  startedBy: SeriesSummary["startedBy"];
  entryId: string;
  items: WorkItem[];
  timeMs: number;
  atHours: number | null;
  /** True where the delivery legitimately changed, so that the baseline before says nothing. */
  resets: boolean;
  sessions: Session[];
}

const isSame = (a: Sequence, b: Sequence) => a.seconds === b.seconds && a.rhythm === b.rhythm;

const startsSeries = (entry: LogEntry) => entry.kind === "work" && entry.body.startsSeries;

/** A check with its delivery; null where it holds nothing to count. */
export function measuredCheck(
  entry: LogEntryOf<"check">,
  sequence: Sequence | null,
  hours: LifetimeHours,
): MeasuredCheck | null {
  const { delivery, flags } = measureDelivery(entry.body, sequence);
  if (!delivery) return null;
  if (entry.body.spoilers?.length) flags.push("spoiled");
  if (entry.body.estimatedHours) flags.push("estimated-hours");
  return {
    entry,
    timeMs: effectiveTime(entry),
    atHours: hours.atHours.get(entry.id) ?? entry.hours,
    hoursCount: !hours.doubtful.some((reading) => reading.entryId === entry.id),
    delivery,
    sequence,
    flags,
  };
}

/** Puts a check with the session before it where it was made within an hour of its first check. */
function addToSessions(sessions: Session[], check: MeasuredCheck): void {
  const session = sessions.at(-1);
  const apart = session ? Math.abs(check.atHours - session[0].atHours) : Infinity;
  if (session && apart <= SESSION_HOURS + 1e-9) sessions[sessions.length - 1] = [...session, check];
  else sessions.push([check]);
}

/**
 * A bike's checks by baseline series and session. A series starts with the first check, after work
 * that says so, or when the sequence changes from one known to another; checks within one engine
 * hour of a session's first belong to that session.
 * Input: the standing entries in effective order. Edges: checks with nothing to count are left out;
 * a series may have no session yet.
 */
export function baselineSeries(standing: readonly LogEntry[], hours: LifetimeHours): Series[] {
  const series: Series[] = [];
  let sequence: Sequence | null = null;
  let lastKnown: Sequence | null = null;
  const start = (entry: LogEntry, startedBy: Series["startedBy"], resets: boolean) =>
    series.push({
      startedBy,
      entryId: entry.id,
      items: entry.kind === "work" ? entry.body.items : [],
      timeMs: effectiveTime(entry),
      atHours: hours.atHours.get(entry.id) ?? null,
      resets,
      sessions: [],
    });

  for (const entry of standing) {
    if (entry.kind === "bike" && entry.body.sequence !== undefined) {
      sequence = entry.body.sequence;
      const changed = sequence && lastKnown && !isSame(sequence, lastKnown);
      if (changed && series.length > 0) start(entry, "sequence", true);
      lastKnown = sequence ?? lastKnown;
    }
    if (entry.kind === "work" && startsSeries(entry))
      start(
        entry,
        "work",
        entry.body.items.some((item) => RESETTING_WORK.includes(item)),
      );
    if (entry.kind === "check") {
      const check = measuredCheck(entry, sequence, hours);
      if (check && series.length === 0) start(entry, "first-check", true);
      const current = series.at(-1);
      if (check && current) addToSessions(current.sessions, check);
    }
  }
  return series;
}
