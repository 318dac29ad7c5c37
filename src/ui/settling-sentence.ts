import type { CheckSummary } from "../../shared/schemas/summary.ts";

/** What there is to say of a check that becomes a baseline, and why it may have to be repeated. */
export function settlingSentence({ action, flags }: Pick<CheckSummary, "action" | "flags">) {
  if (action === "ride") return "This first check is the baseline that later ones are held to.";
  if (flags.includes("below-usual"))
    return "This first check gave so little that the pump may already be tired: make sure before it becomes the baseline.";
  if (flags.includes("reads-high"))
    return "This first check reads far above the baseline before: make sure before it becomes the new one.";
  return "This first check may be below the limit of the baseline before: make sure before it becomes the new one.";
}
