import { compareToBaseline, sameSyringe, type Volume } from "../delivery/compare-to-baseline.ts";
import type { FlagCode } from "../delivery/flags.ts";
import { judge, readsHigh, type Limits } from "../delivery/judge.ts";
import { ASSUMED_GRADUATION_ML } from "../delivery/measure-delivery.ts";
import { runsToSettle } from "../delivery/runs-to-settle.ts";
import { usualDeliveryMl } from "../delivery/usual-delivery-ml.ts";
import type { Action } from "../schemas/entry.ts";
import type { Baseline, CheckSummary } from "../schemas/summary.ts";
import { delivers, lastOf, meanOilTempC } from "./baseline-of.ts";
import type { Session } from "./baseline-series.ts";

/** A first check further than this under the sequence's usual delivery may be of a tired pump. */
const BELOW_USUAL = 0.15;
/** Oil that much warmer or colder than at the baseline is pointed out, K. */
const TEMP_DIFFERENCE_K = 10;

/** What is said of a session. */
export type Judged = Pick<
  CheckSummary,
  "ratio" | "uRatio" | "baselineMl" | "verdict" | "action" | "pLow" | "pDropping" | "runsToSettle"
> & { flags: FlagCode[] };

const VERDICT_RANK = { settling: 0, holding: 1, dropping: 2, low: 3 } as const;
const ACTION_RANK: Record<Action, number> = { ride: 0, repeat: 1, stop: 2 };

// Settling is no better than holding: there is nothing yet to be better than.
const verdictRank = ({ verdict }: Judged) => Math.max(VERDICT_RANK.holding, VERDICT_RANK[verdict]);

export const isMilder = (a: Judged, b: Judged) =>
  verdictRank(a) < verdictRank(b) || ACTION_RANK[a.action] < ACTION_RANK[b.action];

/** The worse verdict stands, with the worse action of the two. */
export function worse(a: Judged, b: Judged): Judged {
  const verdict = verdictRank(b) > verdictRank(a) ? b : a;
  const action = ACTION_RANK[b.action] > ACTION_RANK[a.action] ? b.action : a.action;
  return { ...verdict, action, flags: [...new Set([...a.flags, ...b.flags])] };
}

export const isFaulty = ({ verdict }: Judged) => VERDICT_RANK[verdict] > VERDICT_RANK.holding;

/** A session that becomes the baseline: nothing to compare with yet. */
export function judgeFirst(session: Session, pooled: Volume): Judged {
  const usualMl = usualDeliveryMl(session[0].sequence);
  const belowUsual = usualMl !== null && pooled.perRunMl < (1 - BELOW_USUAL) * usualMl;
  return {
    ratio: null,
    uRatio: null,
    baselineMl: null,
    verdict: "settling",
    action: belowUsual ? "repeat" : "ride",
    pLow: null,
    pDropping: null,
    runsToSettle: null,
    flags: belowUsual ? ["below-usual"] : [],
  };
}

/** A pump that gives nothing is low whatever it gave before. */
export const nothingDelivered = (): Judged => ({
  ratio: 0,
  uRatio: 0,
  baselineMl: null,
  verdict: "low",
  action: "stop",
  pLow: 1,
  pDropping: 1,
  runsToSettle: 0,
  flags: ["no-delivery"],
});

/** A session held to a baseline. */
export function judgeAgainst(
  baseline: Baseline,
  session: Session,
  pooled: Volume,
  limits: Limits,
): Judged {
  const { ratio, uRatio } = compareToBaseline(pooled, baseline);
  const { entry, delivery } = lastOf(session);
  const settle = runsToSettle({
    session: pooled,
    baseline,
    limits,
    capacityMl: entry.body.syringe?.capacityMl ?? pooled.perRunMl,
    graduationMl: entry.body.syringe?.graduationMl ?? ASSUMED_GRADUATION_ML,
    repeatability: delivery.repeatability,
    temperatureMl: delivery.components.temperatureMl,
  });
  const oilTempC = meanOilTempC(session);
  const flags: FlagCode[] = [];
  if (!delivers(pooled)) flags.push("no-delivery");
  if (readsHigh(ratio, uRatio)) flags.push("reads-high");
  if (settle.baselineForbids) flags.push("baseline-cannot-settle");
  if (!sameSyringe(pooled, baseline)) flags.push("syringe-differs");
  if (
    oilTempC !== null &&
    baseline.oilTempC !== null &&
    Math.abs(oilTempC - baseline.oilTempC) > TEMP_DIFFERENCE_K
  )
    flags.push("temperature-differs");
  return {
    ...judge(ratio, uRatio, limits),
    ratio,
    uRatio,
    baselineMl: baseline.perRunMl,
    runsToSettle: settle.runs,
    flags,
  };
}
