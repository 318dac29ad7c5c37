import { checkIntervalHours, nextDue } from "../delivery/next-due.ts";
import type { LogEntry } from "../schemas/entry.ts";
import type { Summary } from "../schemas/summary.ts";
import { baselineSeries } from "./baseline-series.ts";
import { bikeDetails } from "./bike-details.ts";
import { bikeFlags } from "./bike-flags.ts";
import { deliveryTrend } from "./delivery-trend.ts";
import { judgeSeries } from "./judge-series.ts";
import { lifetimeHours } from "./lifetime-hours.ts";
import { placeLastSession } from "./place-last-session.ts";
import { summariseChecks, summariseSeries } from "./summarise-series.ts";
import { standingEntries } from "./standing-entries.ts";

/**
 * Everything a bike's logbook says: hours, baseline series, judged checks, trend, and when the next
 * check is due. The same entries in any order, with any repeats, give the same answer; no present
 * time is needed, so phone and server agree.
 *
 * Units: lifetime engine hours, mL a run at 15 °C, fractions of the baseline, ISO 8601 instants.
 * Edges: struck entries and entries of an unknown kind or version count for nothing; with no check
 * the verdict is *none* and the action null. Never NaN: what is not known is null.
 */
export function summariseLogbook(logbook: {
  ownerId: string;
  entries: readonly LogEntry[];
}): Summary {
  const { standing } = standingEntries(logbook.ownerId, logbook.entries);
  const details = bikeDetails(standing);
  const hours = lifetimeHours(standing);
  const series = judgeSeries(baselineSeries(standing, hours), details);
  const current = series.at(-1);
  const last = current?.sessions.at(-1);
  const placed = placeLastSession(current, hours.now);
  const trend = current ? deliveryTrend(current, details.actDrop) : null;

  return {
    bikeId: logbook.entries[0]?.bikeId ?? "",
    name: details.name,
    hours: {
      now: hours.now,
      readAt: hours.readAtMs === null ? null : new Date(hours.readAtMs).toISOString(),
      displayOffset: hours.displayOffset,
      perWeek: hours.perWeek,
      doubtful: hours.doubtful,
    },
    series: series.map(summariseSeries),
    checks: series.flatMap(summariseChecks),
    verdict: last?.judged.verdict ?? "none",
    action: last?.judged.action ?? null,
    pLow: last?.judged.pLow ?? null,
    trend: trend?.trend ?? null,
    due: nextDue({
      ...placed,
      intervalHours: checkIntervalHours(details),
      limitFromHours: trend?.trend.range?.low ?? null,
      hoursNow: hours.now,
      readAtMs: hours.readAtMs,
      hoursPerWeek: hours.perWeek,
    }),
    flags: [
      ...new Set([
        ...(last?.checks.flatMap((check) => check.flags) ?? []),
        ...(last?.judged.flags ?? []),
        ...bikeFlags(standing, hours, series),
        ...(trend?.scatters ? ["trend-scatter"] : []),
        ...(placed.unplaced ? [placed.unplaced] : []),
      ]),
    ],
  };
}
