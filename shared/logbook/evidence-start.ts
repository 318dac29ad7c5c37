import { SESSION_HOURS, type MeasuredCheck, type Session } from "./baseline-series.ts";
import { DISPLAY_SLACK_HOURS, HOUR_MS } from "./lifetime-hours.ts";

/** What lies further back weighs little beside so many checks, and would take long to pool. */
const MOST_SESSIONS = 20;

/** Whether over an hour was surely ridden between two checks: no more than the clock allows. */
function isApart(earlier: MeasuredCheck, later: MeasuredCheck): boolean {
  const gained = later.atHours - earlier.atHours;
  const passed = (later.timeMs - earlier.timeMs) / HOUR_MS;
  return Math.min(gained, passed + DISPLAY_SLACK_HOURS) > SESSION_HOURS + 1e-9;
}

const countedCheck = (session: Session | undefined) => session?.find((check) => check.hoursCount);

/**
 * The first of the sessions, up to the one at `index`, that may truly be one session with it.
 *
 * Sessions are told apart by their hours; where those are doubted, or were confirmed though fewer
 * passed by the clock, they tell nothing. So it goes back past sessions at doubted hours to the
 * first that was surely over an hour of riding before.
 * Units: engine hours. Edges: `index` itself as a rule; at most 20 sessions.
 *
 * @example evidenceStart([at 12 h, at 32 h, at 33.2 h typed five minutes later], 2) // 1
 */
export function evidenceStart(sessions: readonly Session[], index: number): number {
  let start = index;
  let later = countedCheck(sessions[index]);
  while (start > 0 && index - start < MOST_SESSIONS - 1) {
    const earlier = countedCheck(sessions[start - 1]);
    if (earlier && later && isApart(earlier, later)) break;
    later = earlier ?? later;
    start -= 1;
  }
  return start;
}
