import type { Action, Verdict } from "../schemas/entry.ts";
import type { Due } from "../schemas/summary.ts";

import { flagSentences } from "./flags.ts";

const HOUR_MS = 3_600_000;
const WEEK_MS = 7 * 24 * HOUR_MS;
/** The last date that JavaScript can hold, ms. */
const LAST_DATE_MS = 8.64e15;

/** Hours between checks: longer where a screen keeps grit from the pump. Common practice. */
export const USUAL_INTERVAL_HOURS = { withScreen: 40, withoutScreen: 20 } as const;

/** The interval of a bike, engine hours: its own, else the usual one; unknown counts as no screen. */
export function checkIntervalHours(bike: {
  intervalHours: number | null;
  hasScreen: boolean | null;
}): number {
  const usual = bike.hasScreen
    ? USUAL_INTERVAL_HOURS.withScreen
    : USUAL_INTERVAL_HOURS.withoutScreen;
  return bike.intervalHours ?? usual;
}

export interface DueInput {
  intervalHours: number;
  /** The last judged session; null where the series has no check yet. */
  session: { atHours: number; verdict: Verdict; action: Action } | null;
  /** Why the last session's hours cannot be counted from, where they cannot: then it is due now. */
  unplaced: "hours-doubtful" | "hours-below-session" | null;
  /** Where a declining delivery may reach the limit at the earliest, lifetime hours; else null. */
  limitFromHours: number | null;
  /** The hours reading, its time (ms) and the use of the bike; null where there is none. */
  hoursNow: number | null;
  readAtMs: number | null;
  hoursPerWeek: number | null;
}

/**
 * When the next check falls due, in lifetime engine hours, and why.
 *
 * Formula: the last session's hours plus the interval where the action is *ride* (half of it while
 * *dropping*), its own hours where it is *repeat* or *stop*, the hours now where there is no check.
 * A declining delivery caps it at half of the hours from the session to the early end of the
 * crossing, at least 1 h. `inHours` = due − hours now. `onDate` = time of the last reading +
 * inHours/hours a week, null where the use is not known (or the date is beyond what a date can be).
 * Units: engine hours, ms, hours a week. Source: 20 to 40 h is common practice, no published source.
 * Edges: needs no present time, so phone and server agree; with no reading at all, hours count as 0.
 *
 * @example nextDue({ intervalHours: 20, session: { atHours: 32, verdict: "holding", action: "ride" },
 *   unplaced: null, limitFromHours: null, hoursNow: 32, readAtMs: 0, hoursPerWeek: null }) // atHours 52, inHours 20
 */
export function nextDue(input: DueInput): Due {
  const hoursNow = input.hoursNow ?? input.session?.atHours ?? 0;
  const { afterHours, reason } = afterSession(input);
  const fromHours = input.unplaced ? hoursNow : (input.session?.atHours ?? hoursNow);
  const atHours = fromHours + afterHours;
  const inHours = atHours - hoursNow;
  return { atHours, inHours, overdue: inHours < 0, onDate: likelyDate(input, inHours), reason };
}

function afterSession({ session, unplaced, intervalHours, limitFromHours }: DueInput): {
  afterHours: number;
  reason: string;
} {
  if (!session) return { afterHours: 0, reason: "There is no check of this baseline yet." };
  if (session.action === "stop")
    return { afterHours: 0, reason: "Delivery is low: find the cause, then check again." };
  if (session.action === "repeat")
    return { afterHours: 0, reason: "The last check must be repeated before riding." };
  if (unplaced) return { afterHours: 0, reason: flagSentences[unplaced] };

  const dropping = session.verdict === "dropping";
  const byInterval = dropping ? intervalHours / 2 : intervalHours;
  const byTrend =
    limitFromHours === null ? Infinity : Math.max(1, (limitFromHours - session.atHours) / 2);
  if (byTrend < byInterval)
    return {
      afterHours: byTrend,
      reason: `Delivery is declining: checked again ${hours(byTrend)} after the last check, halfway to where it may be low.`,
    };
  return {
    afterHours: byInterval,
    reason: dropping
      ? `Delivery is dropping: half the interval, ${hours(byInterval)} after the last check.`
      : `Delivery is ${session.verdict}: ${hours(byInterval)} after the last check.`,
  };
}

const hours = (value: number) => `${Number(value.toFixed(1))} h`;

function likelyDate({ readAtMs, hoursPerWeek }: DueInput, inHours: number): string | null {
  if (readAtMs === null || hoursPerWeek === null || hoursPerWeek <= 0) return null;
  const date = readAtMs + (inHours / hoursPerWeek) * WEEK_MS;
  if (!(Math.abs(date) <= LAST_DATE_MS)) return null;
  const day = new Date(date).toISOString().split("T")[0] ?? null;
  // Years past 9999 are written with a sign, which no calendar reads: that is no date to plan by.
  return day?.length === 10 ? day : null;
}
