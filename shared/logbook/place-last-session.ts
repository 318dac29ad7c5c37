import type { DueInput } from "../delivery/next-due.ts";
import type { JudgedSeries } from "./judge-series.ts";

/** Hours now this far below the last session's can only come from another meter. */
const BELOW_SESSION_HOURS = 1;

/**
 * From which hours the next check is counted: the last session's, or, while its hour reading is
 * doubted, those of the last session whose reading counts. Where there is none, or the hours now
 * lie below it (a meter changed without a word), nothing can be counted from it.
 */
export function placeLastSession(
  current: JudgedSeries | undefined,
  hoursNow: number | null,
): Pick<DueInput, "session" | "unplaced"> {
  const last = current?.sessions.at(-1);
  if (!current || !last) return { session: null, unplaced: null };
  const counted = current.sessions.findLast((session) => session.hoursCount);
  const { verdict, action } = last.judged;
  const session = { atHours: (counted ?? last).atHours, verdict, action };
  if (!counted) return { session, unplaced: "hours-doubtful" };
  const below = hoursNow !== null && hoursNow < session.atHours - BELOW_SESSION_HOURS;
  return { session, unplaced: below ? "hours-below-session" : null };
}
