import type { Syringe } from "../../../../shared/schemas/entry.ts";
import { formatMl } from "../../../ui/format-quantity.ts";
import type { CheckPlan } from "./plan-check.ts";

/** Why so many runs, or why this syringe will not do and which would. */
export function planSentence(
  plan: CheckPlan,
  { capacityMl, graduationMl }: Pick<Syringe, "capacityMl" | "graduationMl">,
): string {
  if (plan.expectedMl === null)
    return "How many runs are needed shows after the first one: nothing is known yet of what this pump gives.";
  if (plan.unfit) return unfitSentence(plan, capacityMl, graduationMl);
  return `${whySentence(plan, graduationMl)} ${fillsSentence(plan)}`;
}

function whySentence(plan: CheckPlan, graduationMl: number): string {
  if (plan.settlesLast) return "So many more would settle the last check.";
  if (plan.makesBaseline)
    return "This check makes the baseline that later ones are held to: it gets twice the runs of a usual check.";
  return `So many tell a pump on its baseline from one at the limit, with marks of ${graduationMl} mL.`;
}

function fillsSentence({ fills, runs }: CheckPlan): string {
  if (runs === 1) return "";
  if (fills === 1) return "They fit in the barrel one on top of the other.";
  return `The barrel is emptied ${fills === 2 ? "once" : `${(fills ?? 1) - 1} times`} in between.`;
}

function unfitSentence(plan: CheckPlan, capacityMl: number, graduationMl: number): string {
  const run = `a run of about ${formatMl(plan.expectedMl ?? 0)}`;
  const better = plan.wouldDo
    ? `A ${plan.wouldDo.capacityMl} mL syringe with ${plan.wouldDo.graduationMl} mL marks would do.`
    : "No usual syringe would do better against this baseline.";
  if (plan.unfit === "barrel-too-small")
    return `This ${capacityMl} mL barrel is too small for ${run}. ${better}`;
  return `Marks of ${graduationMl} mL are too coarse for ${run}: ten runs would not tell a sound pump from one at the limit. ${better} You can go on with this one: the result says how sure it is.`;
}
