import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { byEffectiveOrder, effectiveTime } from "../../../../shared/logbook/effective-order.ts";
import type { JudgedSeries } from "../../../../shared/logbook/judge-series.ts";
import { lifetimeHours } from "../../../../shared/logbook/lifetime-hours.ts";
import type { LogEntry, LogEntryOf } from "../../../../shared/schemas/entry.ts";
import { ofBaseline, volumeOf, type HistoryPoint } from "./history-point.ts";

/**
 * Struck checks as they would stand: by the meter, the sequence and the series of their own time.
 * Those of which nothing could be counted are left out.
 */
export function struckPoints(
  checks: readonly LogEntryOf<"check">[],
  standing: readonly LogEntry[],
  series: readonly JudgedSeries[],
): HistoryPoint[] {
  const meters = meterOffsets(standing);
  const patches = standing.filter((entry) => entry.kind === "bike");
  return checks.flatMap((entry) => {
    const isEarlier = (other: LogEntry) => byEffectiveOrder(other, entry) < 0;
    const { sequence } = bikeDetails(patches.filter(isEarlier));
    const { delivery, flags } = measureDelivery(entry.body, sequence);
    if (!delivery) return [];
    const started = series.findLastIndex((one) => one.series.timeMs <= effectiveTime(entry));
    const index = Math.max(0, started);
    const baseline = series[index]?.reference ?? null;
    const offset = meters.findLast(({ meter }) => isEarlier(meter))?.offset ?? 0;
    return {
      entryId: entry.id,
      at: entry.at,
      atHours: entry.hours + offset,
      hoursCount: true,
      series: index,
      perRunMl: delivery.perRunMl,
      uMl: delivery.uMl,
      ...ofBaseline(volumeOf(entry, delivery), baseline, false),
      verdict: null,
      flags,
    };
  });
}

/** What each change of the meter made of lifetime less displayed hours. */
function meterOffsets(standing: readonly LogEntry[]) {
  return standing.flatMap((meter, index) =>
    meter.kind === "meter"
      ? { meter, offset: lifetimeHours(standing.slice(0, index + 1)).displayOffset }
      : [],
  );
}
