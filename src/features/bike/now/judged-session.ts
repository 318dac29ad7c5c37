import type { CheckSummary, Summary } from "../../../../shared/schemas/summary.ts";
import type { LastSession } from "../history/delivery-history.ts";

export type JudgedSession = Pick<
  CheckSummary,
  "verdict" | "action" | "pLow" | "runsToSettle" | "flags"
> & { ratio: number | null; uRatio: number | null };

/** The session last judged in the present series, with its share of what it is held to. */
export function judgedSession(summary: Summary, session: LastSession | null): JudgedSession | null {
  const check = session && summary.checks.at(-1);
  if (!check) return null;
  const { verdict, action, pLow, runsToSettle, flags } = check;
  const ratio = session.baseline && session.perRunMl / session.baseline.perRunMl;
  return { verdict, action, pLow, runsToSettle, flags, ratio, uRatio: session.uRatio };
}
