import type { CheckSummary, Summary } from "../schemas/summary.ts";
import { SESSION_HOURS } from "./baseline-series.ts";

/**
 * The checks of the last session, in effective order: those judged together, within an hour of the
 * first of them, in the same baseline series. Edge: empty where there is no check.
 *
 * @example lastSession({ checks: [at 10 h, at 30 h, at 30.5 h] }) // the checks at 30 h and 30.5 h
 */
export function lastSession({ checks }: Pick<Summary, "checks">): CheckSummary[] {
  let session: CheckSummary[] = [];
  for (const check of checks) {
    const [first] = session;
    const together =
      first?.series === check.series &&
      Math.abs(check.atHours - first.atHours) <= SESSION_HOURS + 1e-9;
    session = together ? [...session, check] : [check];
  }
  return session;
}
