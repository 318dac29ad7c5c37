/** The quick form half filled in, as it stands in the phone's store. */
import { z } from "zod";
import type { Sequence } from "../../../../shared/schemas/entry.ts";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { beginCheck, changeRun, startTextOf } from "../draft/check-draft.ts";
import { checkDraftSchema, closeOutItems, type CheckDraft } from "../draft/check-draft-schema.ts";
import { checkEntry, type CheckEntry } from "../draft/check-entry.ts";
import { levelErrors } from "../draft/level-errors.ts";
import { typedErrors } from "../draft/set-up-errors.ts";

export const QUICK_FORM = "quick-check";

export const quickDraftSchema = checkDraftSchema.extend({
  /** What is known of the runs: the levels read, or the volumes alone, as on an old note. */
  known: z.enum(["levels", "volumes"]),
  volumes: z.array(z.string()),
});

export type QuickDraft = z.infer<typeof quickDraftSchema>;

type Beginning = Omit<Parameters<typeof beginCheck>[0], "hoseMaybeOff">;

export const beginQuick = (beginning: Beginning): QuickDraft => ({
  ...changeRun(beginCheck({ ...beginning, hoseMaybeOff: false }), 1, {}),
  known: "levels",
  volumes: [""],
});

/** One more run; `anew` where the barrel was emptied before it. */
export const addRun = <D extends CheckDraft>(draft: D, anew: boolean): D => ({
  ...draft,
  ...changeRun(draft, draft.runs.length + 1, anew ? { startText: "" } : {}),
});

export const closeOutAll = (closedOut: boolean) => (closedOut ? [...closeOutItems] : []);

/** What is wrong as typed, a sentence a field: `hours`, `oilTemp`, `runs.0.start`, `volumes.1` … */
export function quickErrors(draft: QuickDraft): Record<string, string> {
  const errors = typedErrors(draft);
  if (draft.known === "volumes") {
    draft.volumes.forEach((text, index) => {
      const volume = parseDecimal(text);
      if (volume === null || volume < 0)
        errors[`volumes.${index}`] = "Type what the run gave, in mL.";
    });
    return errors;
  }
  draft.runs.forEach((run, index) => {
    const startText = startTextOf(draft, index + 1, null);
    const wrong = levelErrors({ startText, endText: run.endText }, draft.syringe);
    for (const [end, sentence] of Object.entries(wrong)) errors[`runs.${index}.${end}`] = sentence;
  });
  return errors;
}

/** The entry that the form stands for; null while something is missing or wrong. */
export function quickEntry(
  draft: QuickDraft,
  bike: { bikeId: string; sequence: Sequence | null },
): CheckEntry | null {
  if (Object.keys(quickErrors(draft)).length > 0) return null;
  return draft.known === "levels"
    ? checkEntry(draft, bike)
    : checkEntry(
        { ...draft, runs: [] },
        bike,
        draft.volumes.map((text) => ({ deliveredMl: parseDecimal(text) ?? 0 })),
      );
}
