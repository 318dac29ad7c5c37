import { Notice } from "../../../ui/notice.tsx";
import { planSentence } from "../draft/plan-sentence.ts";
import { useOpenCheck } from "../open-check.ts";

/** How many runs today, and why. */
export function RunsNeeded() {
  const { plan, draft } = useOpenCheck();
  if (!draft.syringe) return null;
  const sentence = planSentence(plan, draft.syringe);
  if (plan.unfit) return <Notice tone="caution">{sentence}</Notice>;
  if (plan.runs === null) return <p>{sentence}</p>;
  return (
    <p className="flex items-center gap-4">
      <span className="flex shrink-0 flex-col items-center">
        <strong className="text-figure">{plan.runs}</strong>
        <span className="font-bold">{plan.runs === 1 ? "run" : "runs"}</span>
      </span>
      <span>{sentence}</span>
    </p>
  );
}
