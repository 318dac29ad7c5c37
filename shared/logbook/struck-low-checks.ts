import { compareToBaseline } from "../delivery/compare-to-baseline.ts";
import { judge, type Limits } from "../delivery/judge.ts";
import type { LogEntry, LogEntryOf, Sequence } from "../schemas/entry.ts";
import { baselineSeries, measuredCheck } from "./baseline-series.ts";
import { bikeDetails } from "./bike-details.ts";
import { byEffectiveOrder, effectiveTime } from "./effective-order.ts";
import { delivers, volumeOf } from "./baseline-of.ts";
import { judgeSeries, type JudgedSeries } from "./judge-series.ts";
import { lifetimeHours } from "./lifetime-hours.ts";
import { standingEntries } from "./standing-entries.ts";

/** Each struck check once, with the bike's sequence at its time, oldest first. */
function struckChecks(
  entries: readonly LogEntry[],
  standing: readonly LogEntry[],
  struck: ReadonlySet<string>,
): { check: LogEntryOf<"check">; sequence: Sequence | null }[] {
  const checks = new Map<string, LogEntryOf<"check">>();
  for (const entry of entries)
    if (entry.kind === "check" && struck.has(entry.id)) checks.set(entry.id, entry);
  let sequence: Sequence | null = null;
  return [...standing, ...checks.values()].sort(byEffectiveOrder).flatMap((entry) => {
    if (entry.kind === "bike" && entry.body.sequence !== undefined) sequence = entry.body.sequence;
    return entry.kind === "check" && checks.has(entry.id) ? [{ check: entry, sequence }] : [];
  });
}

/**
 * What a check at that time would have been held to: the baseline of the series then in force, or,
 * before its first session, of the series before, unless the pump was renewed between the two.
 */
function referenceAt(timeMs: number, series: readonly JudgedSeries[]) {
  const index = series.findLastIndex((one) => one.series.timeMs <= timeMs);
  const inForce = series[index];
  const firstMs = inForce?.sessions[0]?.checks[0].timeMs ?? Infinity;
  if (!inForce || timeMs > firstMs) return inForce?.reference ?? null;
  return inForce.series.resets ? null : (series[index - 1]?.reference ?? null);
}

/**
 * The struck checks that, had they stood, would have been judged *low*: a *low* check that was
 * struck is shown to whoever relies on the log. Each is judged by itself, with the limits of today,
 * against the baseline that stood at its time.
 * Answers ids, oldest first. Edges: a struck check with nothing to count or to be compared with is
 * not low; one that delivered nothing is.
 *
 * @example struckLowChecks({ ownerId, entries: [check 3.0 mL, check 1.2 mL, strike of it] }) // its id
 */
export function struckLowChecks(logbook: {
  ownerId: string;
  entries: readonly LogEntry[];
}): string[] {
  const { standing, struck } = standingEntries(logbook.ownerId, logbook.entries);
  const checks = struckChecks(logbook.entries, standing, struck);
  if (checks.length === 0) return [];
  const limits = bikeDetails(standing);
  const hours = lifetimeHours(standing);
  const series = judgeSeries(baselineSeries(standing, hours), limits);
  return checks
    .filter(({ check, sequence }) => {
      const measured = measuredCheck(check, sequence, hours);
      const reference = referenceAt(effectiveTime(check), series);
      return measured !== null && isLow(volumeOf(measured), reference, limits);
    })
    .map(({ check }) => check.id);
}

function isLow(
  volume: ReturnType<typeof volumeOf>,
  reference: JudgedSeries["reference"],
  limits: Limits,
): boolean {
  if (!delivers(volume)) return true;
  if (!reference) return false;
  const { ratio, uRatio } = compareToBaseline(volume, reference);
  return judge(ratio, uRatio, limits).verdict === "low";
}
