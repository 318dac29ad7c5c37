import type { Volume } from "../delivery/compare-to-baseline.ts";
import { poolSession } from "../delivery/pool-session.ts";
import type { Baseline } from "../schemas/summary.ts";
import type { MeasuredCheck, Series, Session } from "./baseline-series.ts";

export const volumeOf = (check: MeasuredCheck): Volume => ({
  perRunMl: check.delivery.perRunMl,
  uMl: check.delivery.uMl,
  uScaleMl: check.delivery.uScaleMl,
  syringeId: check.entry.body.syringe?.id ?? null,
});

export const lastOf = (checks: Session) => checks[checks.length - 1] ?? checks[0];

export function meanOilTempC(checks: Session): number | null {
  const temps = checks.flatMap((check) => check.entry.body.oilTempC ?? []);
  return temps.length > 0 ? temps.reduce((sum, temp) => sum + temp, 0) / temps.length : null;
}

/** Less than this a run, mL, is nothing: no syringe's marks come near it. */
const NOTHING_ML = 0.001;

/** Whether anything was delivered at all. */
export const delivers = ({ perRunMl }: Pick<Volume, "perRunMl">) => perRunMl >= NOTHING_ML;

/** The first session that delivered anything: nothing can be compared with nothing. */
export const baselineIndex = (pooled: readonly Volume[]) => pooled.findIndex(delivers);

export function poolSessions(sessions: readonly Session[]) {
  return sessions.map((session) => poolSession(session.map(volumeOf)));
}

/**
 * The baseline of a series: its first session that delivered anything, as a volume with its
 * uncertainty (mL a run at 15 °C). Edge: null until there is one.
 */
export function baselineOf({ sessions }: Pick<Series, "sessions">): Baseline | null {
  const pooled = poolSessions(sessions);
  const index = baselineIndex(pooled);
  const [session, volume] = [sessions[index], pooled[index]];
  if (!session || !volume) return null;
  const { disagrees: _, ...baseline } = volume;
  return { ...baseline, oilTempC: meanOilTempC(session), atHours: lastOf(session).atHours };
}
