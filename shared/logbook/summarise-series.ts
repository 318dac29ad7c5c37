import type { CheckSummary, SeriesSummary } from "../schemas/summary.ts";
import type { JudgedSeries } from "./judge-series.ts";

const isoInstant = (timeMs: number) => new Date(timeMs).toISOString();

export function summariseSeries({ series, baseline }: JudgedSeries): SeriesSummary {
  return {
    startedBy: series.startedBy,
    entryId: series.entryId,
    items: series.items,
    at: isoInstant(series.timeMs),
    atHours: series.atHours,
    baseline,
  };
}

/** The checks of a series, each with what its whole session was judged to be. */
export function summariseChecks({ sessions }: JudgedSeries, series: number): CheckSummary[] {
  return sessions.flatMap(({ checks, judged }) =>
    checks.map(({ entry, timeMs, atHours, delivery, flags }) => ({
      ...judged,
      entryId: entry.id,
      at: isoInstant(timeMs),
      atHours,
      series,
      perRunMl: delivery.perRunMl,
      uMl: delivery.uMl,
      uScaleMl: delivery.uScaleMl,
      runsCounted: delivery.runsCounted,
      flags: [...flags, ...judged.flags],
    })),
  );
}
