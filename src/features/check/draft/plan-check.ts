import {
  BASELINE_RUNS_FACTOR,
  planRuns,
  type PlannedRuns,
} from "../../../../shared/delivery/plan-runs.ts";
import { runsPerFill } from "../../../../shared/delivery/runs-per-fill.ts";
import { usualDeliveryMl } from "../../../../shared/delivery/usual-delivery-ml.ts";
import type { Sequence, Syringe } from "../../../../shared/schemas/entry.ts";
import type { Summary } from "../../../../shared/schemas/summary.ts";
import { usualScales } from "../../../ui/column-scale.ts";

export interface CheckPlan {
  /** What one run is expected to give, mL; null where nothing is known of it. */
  expectedMl: number | null;
  /** True where this check makes the baseline. */
  makesBaseline: boolean;
  /** Runs asked for today; null where that cannot be said. */
  runs: number | null;
  fills: number | null;
  /** True where these are the runs still missing to settle the last check. */
  settlesLast: boolean;
  /** Why this syringe will not do. */
  unfit: Extract<PlannedRuns, { runs: null }>["reason"] | null;
  /** A barrel as commonly sold that would do, where this one will not. */
  wouldDo: { capacityMl: number; graduationMl: number } | null;
}

type Barrel = Pick<Syringe, "capacityMl" | "graduationMl">;

/** What one run gives: the baseline, else the last check, else what the sequence usually gives. */
export function expectedMl(summary: Summary, sequence: Sequence | null): number | null {
  const series = summary.series.at(-1);
  if (series?.baseline) return series.baseline.perRunMl;
  // What another sequence gave says nothing of this one.
  const last = series?.startedBy === "sequence" ? undefined : summary.checks.at(-1);
  return (last?.perRunMl || null) ?? usualDeliveryMl(sequence);
}

/**
 * How many runs today's check needs with a syringe, and which barrel would do where that one will
 * not. A check that makes the baseline is asked for twice the runs. `atHours` are lifetime hours;
 * `readMl`, what the runs of this check gave so far, counts where nothing else is known.
 */
export function planCheck(
  summary: Summary,
  bike: {
    sequence: Sequence | null;
    actDrop: number;
    atHours: number | null;
    readMl?: number | null;
  },
  syringe: Barrel | null,
): CheckPlan {
  const baseline = summary.series.at(-1)?.baseline ?? null;
  const { readMl = null } = bike;
  const expected =
    expectedMl(summary, bike.sequence) ?? (readMl !== null && readMl > 0 ? readMl : null);
  const plan = (barrel: Barrel) =>
    planRuns({
      expectedMl: expected ?? 0,
      syringe: barrel,
      uBaselineRelative: baseline && baseline.uMl / baseline.perRunMl,
      actDrop: bike.actDrop,
    });
  const nothing = {
    expectedMl: expected,
    makesBaseline: baseline === null,
    runs: null,
    fills: null,
    settlesLast: false,
    unfit: null,
    wouldDo: null,
  };
  if (expected === null || !syringe) return nothing;
  const planned = plan(syringe);
  if (planned.runs === null)
    return { ...nothing, unfit: planned.reason, wouldDo: barrelThatWouldDo(plan) };
  const settling = runsToSettleLast(summary, bike.atHours);
  const runs = settling ?? planned.runs * (baseline ? 1 : BASELINE_RUNS_FACTOR);
  const fills = Math.ceil(runs / runsPerFill(syringe.capacityMl, expected));
  return { ...nothing, runs, fills, settlesLast: settling !== null };
}

/** A check made this close to the last one, engine hours, is judged together with it. */
const SESSION_HOURS = 1;

/** The runs still missing where the last check is to be repeated and this one is part of it. */
function runsToSettleLast({ action, checks }: Summary, atHours: number | null): number | null {
  const last = checks.at(-1);
  if (action !== "repeat" || !last || atHours === null) return null;
  const together = Math.abs(atHours - last.atHours) <= SESSION_HOURS;
  return together && last.runsToSettle ? last.runsToSettle : null;
}

/** Of the barrels that would do, the one that needs the fewest runs. */
function barrelThatWouldDo(plan: (barrel: Barrel) => PlannedRuns): CheckPlan["wouldDo"] {
  const fit = usualScales
    .map(({ maxMl, graduationMl }) => ({ capacityMl: maxMl, graduationMl }))
    .map((barrel) => ({ barrel, planned: plan(barrel) }))
    .filter(({ planned }) => planned.runs !== null);
  fit.sort((a, b) => (a.planned.runs ?? 0) - (b.planned.runs ?? 0));
  return fit[0]?.barrel ?? null;
}
