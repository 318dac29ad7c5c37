import { flagSentences } from "../../../../shared/delivery/flags.ts";
import type { CheckSummary } from "../../../../shared/schemas/summary.ts";
import { formatPercent, GIVE_OR_TAKE } from "../../../ui/format-quantity.ts";
import { settlingSentence } from "../../../ui/settling-sentence.ts";

interface Judged extends Pick<CheckSummary, "verdict" | "action" | "flags"> {
  ratio: number | null;
  uRatio: number | null;
}

/** Why the action is what it is. `judged` is the session last judged, null where there is none. */
export function whySentence(judged: Judged | null, actLimit: number): string {
  if (!judged) return "Make a delivery check before you rely on the pump.";
  const { verdict, action, ratio, uRatio } = judged;
  if (judged.flags.includes("no-delivery")) return flagSentences["no-delivery"];
  if (verdict === "settling" || ratio === null || uRatio === null) return settlingSentence(judged);
  const delivers = `The pump delivers ${formatPercent(ratio)} of its baseline, give or take ${formatPercent(GIVE_OR_TAKE * uRatio)}`;
  const limit = formatPercent(actLimit);
  if (verdict === "low") return `${delivers}: below the limit of ${limit}.`;
  if (judged.flags.includes("reads-high")) return `${delivers}: too much to be true.`;
  if (action === "repeat") return `${delivers}: it may be below the limit of ${limit}.`;
  return `${delivers}.`;
}
