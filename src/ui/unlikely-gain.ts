import type { Summary } from "../../shared/schemas/summary.ts";
import { formatDay } from "./format-when.ts";

const WEEK_MS = 7 * 24 * 3_600_000;
/** No reading is asked about that gains no more than a few long days' riding, hours. */
const LARGE_GAIN_HOURS = 40;
/** Far beyond: this many times what the bike usually does in that time. */
const FAR_BEYOND = 3;

/**
 * Asks about a reading that is possible by the clock and yet unlikely: 320 typed for 32.0. Null
 * where it may well be so. Only asked: what counts is decided by the logbook's own rule.
 */
export function unlikelyGain(
  { now, readAt, displayOffset, perWeek }: Summary["hours"],
  shownHours: number | null,
  at: string,
): string | null {
  if (shownHours === null || now === null || readAt === null) return null;
  const gained = shownHours + displayOffset - now;
  const weeks = Math.max(0, Date.parse(at) - Date.parse(readAt)) / WEEK_MS;
  const usual = perWeek === null ? 0 : perWeek * weeks;
  if (gained <= Math.max(LARGE_GAIN_HOURS, FAR_BEYOND * usual)) return null;
  return `${Math.round(gained)}\u00a0h more than on ${formatDay(readAt)}. Is that right?`;
}
