import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { byEffectiveOrder, effectiveTime } from "../../../../shared/logbook/effective-order.ts";
import type { JudgedSeries } from "../../../../shared/logbook/judge-series.ts";
import { lifetimeHours } from "../../../../shared/logbook/lifetime-hours.ts";
import type { LogEntry, LogEntryOf } from "../../../../shared/schemas/entry.ts";
import { ofBaseline, volumeOf, type HistoryPoint } from "./history-point.ts";

/**
 * A struck check as it would stand: by the meter, the sequence and the series of its own time.
 * Null where nothing of it could be counted.
 */
export function struckPoint(
  entry: LogEntryOf<"check">,
  standing: readonly LogEntry[],
  series: readonly JudgedSeries[],
): HistoryPoint | null {
  const before = standing.filter((earlier) => byEffectiveOrder(earlier, entry) < 0);
  const { delivery, flags } = measureDelivery(entry.body, bikeDetails(before).sequence);
  if (!delivery) return null;
  const started = series.findLastIndex((one) => one.series.timeMs <= effectiveTime(entry));
  const index = Math.max(0, started);
  const baseline = series[index]?.reference ?? null;
  return {
    entryId: entry.id,
    at: entry.at,
    atHours: entry.hours + lifetimeHours(before).displayOffset,
    hoursCount: true,
    series: index,
    perRunMl: delivery.perRunMl,
    uMl: delivery.uMl,
    ...ofBaseline(volumeOf(entry, delivery), baseline, false),
    verdict: null,
    flags,
  };
}
