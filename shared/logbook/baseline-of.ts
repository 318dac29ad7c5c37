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
 * The baseline of a series: its first session that delivered anything.
 *
 * Formula: the session pooled (`poolSession`), with its oil's mean temperature where written down, at
 * its last check's hours. Units: mL a run at 15 °C, °C, lifetime hours. Source: GUM (JCGM 100).
 * Edges: sessions of under 0.001 mL a run are none; null until there is one.
 *
 * @example baselineOf({ sessions: [[0 mL at 10 h], [3 mL at 12 h], [2.9 mL at 32 h]] })
 * // { perRunMl: 2.989, uMl: 0.1017, …, oilTempC: null, atHours: 12 }
 */
export function baselineOf({ sessions }: Pick<Series, "sessions">): Baseline | null {
  const pooled = poolSessions(sessions);
  const index = baselineIndex(pooled);
  const [session, volume] = [sessions[index], pooled[index]];
  if (!session || !volume) return null;
  const { disagrees: _, ...baseline } = volume;
  return { ...baseline, oilTempC: meanOilTempC(session), atHours: lastOf(session).atHours };
}
