import { compareToBaseline, type Volume } from "../../shared/delivery/compare-to-baseline.ts";
import { judge, type Judgement } from "../../shared/delivery/judge.ts";
import { measureDelivery } from "../../shared/delivery/measure-delivery.ts";
import { BASELINE_RUNS_FACTOR } from "../../shared/delivery/plan-runs.ts";
import { USUAL_ACT_DROP, USUAL_WATCH_DROP, type CheckBody } from "../../shared/schemas/entry.ts";
import type { PlannedCell } from "./cells.ts";
import type { Random } from "./random.ts";
import { simulateCheck, type Reading } from "./simulated-check.ts";

const LIMITS = { watchDrop: USUAL_WATCH_DROP, actDrop: USUAL_ACT_DROP };

export type Decision = Judgement["verdict"] | Judgement["action"];

/** How often, as a share of all checks, each verdict and each action was given. */
export type Shares = Record<Decision, number>;

function measured(body: CheckBody): Volume {
  const { delivery } = measureDelivery(body, null);
  if (!delivery) throw new Error("A simulated check always counts.");
  return { ...delivery, syringeId: body.syringe?.id ?? null };
}

/** One pump's baseline, made with `baselineRuns`, and one check of it at a true ratio to it. */
function compared(
  { nominalMl, syringe }: PlannedCell,
  trueRatio: number,
  [baselineRuns, runs]: [number, number],
  reading: Reading,
  random: Random,
) {
  const check = (ratio: number, count: number) => {
    const pump = { trueMl: nominalMl * ratio, expectedMl: nominalMl };
    return measured(simulateCheck(pump, count, syringe, reading, random));
  };
  const baseline = check(1, baselineRuns);
  return compareToBaseline(check(trueRatio, runs), baseline);
}

/** What `checks` checks of as many pumps are judged to be, all at one true ratio. */
export function countDecisions(
  cell: PlannedCell,
  trueRatio: number,
  checks: number,
  random: Random,
  reading: Reading = "assumed",
): Shares {
  const shares = { holding: 0, dropping: 0, low: 0, ride: 0, repeat: 0, stop: 0 };
  const { runs } = cell.plan;
  for (let i = 0; i < checks; i++) {
    const counts: [number, number] = [BASELINE_RUNS_FACTOR * runs, runs];
    const { ratio, uRatio } = compared(cell, trueRatio, counts, reading, random);
    const { verdict, action } = judge(ratio, uRatio, LIMITS);
    shares[verdict] += 1 / checks;
    shares[action] += 1 / checks;
  }
  return shares;
}

/**
 * The habit to compare with: a single run, held to a single run. Answers the ratios found of sound
 * pumps, the lowest first.
 */
export function singleRunRatios(cell: PlannedCell, checks: number, random: Random): number[] {
  const ratios = Array.from(
    { length: checks },
    () => compared(cell, 1, [1, 1], "assumed", random).ratio,
  );
  return ratios.sort((a, b) => a - b);
}
