import { DUE_SOON_HOURS, type LineUpFacts, type LineUpPlace } from "../schemas/club.ts";
import { USUAL_ACT_DROP, USUAL_WATCH_DROP, type LogEntry } from "../schemas/entry.ts";
import type { Summary } from "../schemas/summary.ts";
import { bikeDetails } from "./bike-details.ts";
import { bikeTag } from "./bike-tag.ts";
import { lifetimeHours } from "./lifetime-hours.ts";
import { pumpHours } from "./pump-hours.ts";
import { standingAdvice } from "./standing-advice.ts";
import { standingEntries } from "./standing-entries.ts";
import { struckLowChecks } from "./struck-low-checks.ts";

/** The worst that can be said of a bike; its index in `lineUpOrder` is its rank on the board. */
export function lineUpPlace(bike: {
  retired: boolean;
  stopAdvised: boolean;
  summary: Pick<Summary, "action" | "verdict" | "due">;
}): LineUpPlace {
  const { action, verdict, due } = bike.summary;
  if (bike.retired) return "retired";
  if (action === "stop" || bike.stopAdvised) return "stop";
  if (action === "repeat") return "repeat";
  if (due.overdue) return "overdue";
  if (verdict === "dropping") return "dropping";
  // Without any check the next one is always due: that says nothing but that there is none.
  if (verdict === "none") return "settling";
  if (due.inHours <= DUE_SOON_HOURS) return "due-soon";
  return verdict === "settling" ? "settling" : "holding";
}

/** Change of the delivery per engine hour, as a fraction of the present series' baseline. */
function trendPerHour({ trend, series }: Summary): number | null {
  const baselineMl = series.at(-1)?.baseline?.perRunMl;
  return trend && baselineMl ? trend.perHour / baselineMl : null;
}

/**
 * What the Line-up shows of a bike, beside its summary: made from the same log, on phone and server
 * alike, with no present time. Never NaN: what is not known is null.
 */
export function lineUpFacts(
  logbook: { ownerId: string; entries: readonly LogEntry[] },
  summary: Summary,
): LineUpFacts {
  const { standing } = standingEntries(logbook.ownerId, logbook.entries);
  const { retired, watchDrop, actDrop } = bikeDetails(standing);
  const stopAdvised = standingAdvice(standing)?.body.advice === "stop";
  const lastCheck = summary.checks.at(-1);
  return {
    bikeId: summary.bikeId,
    name: summary.name,
    tag: bikeTag(summary.bikeId),
    place: lineUpPlace({ retired, stopAdvised, summary }),
    action: summary.action,
    verdict: summary.verdict,
    ratio: summary.verdict === "none" ? null : (lastCheck?.ratio ?? null),
    trendPerHour: trendPerHour(summary),
    hoursNow: summary.hours.now,
    dueInHours: summary.due.inHours,
    onDate: summary.due.onDate,
    lastCheckAt: lastCheck?.at ?? null,
    pumpHours: pumpHours(standing, lifetimeHours(standing)),
    limitsTightened: watchDrop < USUAL_WATCH_DROP || actDrop < USUAL_ACT_DROP,
    lowCheckStruck: struckLowChecks(logbook).length > 0,
    stopAdvised,
    hoseMaybeOff: summary.flags.includes("not-closed-out"),
  };
}
