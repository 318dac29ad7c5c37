import type { Volume } from "../../../../shared/delivery/compare-to-baseline.ts";
import { baselineIndex } from "../../../../shared/logbook/baseline-of.ts";
import { baselineSeries } from "../../../../shared/logbook/baseline-series.ts";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { judgeSeries, type JudgedSeries } from "../../../../shared/logbook/judge-series.ts";
import { lifetimeHours } from "../../../../shared/logbook/lifetime-hours.ts";
import { standingEntries } from "../../../../shared/logbook/standing-entries.ts";
import type { LogEntry, LogEntryOf, Syringe } from "../../../../shared/schemas/entry.ts";
import type { Baseline } from "../../../../shared/schemas/summary.ts";
import { ofBaseline, volumeOf, type HistoryPoint } from "./history-point.ts";
import { seriesCause } from "./series-cause.ts";
import { struckPoints } from "./struck-points.ts";

export interface HistorySeries {
  /** The entry that began it, and what that was in a few words. */
  entryId: string;
  cause: string;
  /** Lifetime hours; null where the entry that began it carried none. */
  atHours: number | null;
  /** What its checks are held to: its own baseline, or an earlier one that it could not replace. */
  baseline: Baseline | null;
  holdsToEarlier: boolean;
}

export interface LastSession extends Volume {
  syringe: Syringe | null;
  baseline: Baseline | null;
  uRatio: number | null;
}

export interface DeliveryHistory {
  series: HistorySeries[];
  /** By hours, struck checks among them. */
  points: HistoryPoint[];
  /** Of the present series; null where it has no check yet. */
  lastSession: LastSession | null;
  /** Fractions of the baseline below which the delivery is dropping, and low. */
  watchLimit: number;
  actLimit: number;
}

/**
 * All deliveries a logbook holds, each against the baseline that its series is held to. Struck
 * checks are measured as well, and count for nothing.
 */
export function deliveryHistory(ownerId: string, entries: readonly LogEntry[]): DeliveryHistory {
  const { standing, struck } = standingEntries(ownerId, entries);
  const { watchDrop, actDrop } = bikeDetails(standing);
  const hours = lifetimeHours(standing);
  const series = judgeSeries(baselineSeries(standing, hours), { watchDrop, actDrop });
  const struckChecks = entries.filter(
    (entry): entry is LogEntryOf<"check"> => entry.kind === "check" && struck.has(entry.id),
  );
  const points = [...series.flatMap(pointsOf), ...struckPoints(struckChecks, standing, series)];
  return {
    series: series.map(describeSeries),
    points: points.sort(byHours),
    lastSession: lastSessionOf(series.at(-1)),
    watchLimit: 1 - watchDrop,
    actLimit: 1 - actDrop,
  };
}

const byHours = (a: HistoryPoint, b: HistoryPoint) =>
  a.atHours - b.atHours || Date.parse(a.at) - Date.parse(b.at);

function describeSeries({ series, baseline, reference }: JudgedSeries): HistorySeries {
  return {
    entryId: series.entryId,
    cause: seriesCause(series),
    atHours: series.atHours,
    baseline: reference,
    holdsToEarlier: reference !== baseline,
  };
}

/** Whether a session is the baseline that its series is held to. */
function isBaselineOf({ sessions, baseline, reference }: JudgedSeries, index: number): boolean {
  return reference === baseline && index === baselineIndex(sessions.map(({ pooled }) => pooled));
}

function pointsOf(judgedSeries: JudgedSeries, seriesIndex: number): HistoryPoint[] {
  const { sessions, reference } = judgedSeries;
  return sessions.flatMap(({ checks, judged }, index) =>
    checks.map(({ entry, atHours, hoursCount, delivery, flags }) => ({
      entryId: entry.id,
      at: entry.at,
      atHours,
      hoursCount,
      series: seriesIndex,
      perRunMl: delivery.perRunMl,
      uMl: delivery.uMl,
      ...ofBaseline(volumeOf(entry, delivery), reference, isBaselineOf(judgedSeries, index)),
      verdict: judged.verdict,
      flags: [...new Set([...flags, ...judged.flags])],
    })),
  );
}

function lastSessionOf(present: JudgedSeries | undefined): LastSession | null {
  const session = present?.sessions.at(-1);
  if (!present || !session) return null;
  const isBaseline = isBaselineOf(present, present.sessions.length - 1);
  return {
    ...session.pooled,
    syringe: session.checks[0].entry.body.syringe,
    baseline: present.reference,
    uRatio: ofBaseline(session.pooled, present.reference, isBaseline).uRatio,
  };
}
