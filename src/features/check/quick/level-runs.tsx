import { MAX_RUNS } from "../../../../shared/schemas/entry.ts";
import { Button } from "../../../ui/button.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { changeRun, startTextOf } from "../draft/check-draft.ts";
import { addRun } from "./quick-draft.ts";
import type { QuickRunsProps } from "./quick-runs.tsx";

const USUAL_STEP_ML = 0.1;

/** Start and end of each run: on top of the one before, or anew in an emptied barrel. */
export function LevelRuns({ draft, edit, errors }: QuickRunsProps) {
  const step = draft.syringe ? draft.syringe.graduationMl / 2 : USUAL_STEP_ML;
  const type = (n: number, typed: { startText?: string; endText?: string }) =>
    edit((now) => ({ ...now, ...changeRun(now, n, typed) }));
  return (
    <>
      {draft.runs.map((run, index) => (
        <fieldset key={index} className="flex flex-wrap gap-3 border-t border-rule pt-3">
          <legend className="sr-only">Run {index + 1}</legend>
          <div className="flex-[1_1_14rem]">
            <NumberField
              label={`Run ${index + 1}: level before`}
              error={errors[`runs.${index}.start`] ?? errors[`body.runs.${index}.startMl`]}
              value={startTextOf(draft, index + 1, null)}
              onChange={(startText) => type(index + 1, { startText })}
              step={step}
              min={0}
              unit="mL"
            />
          </div>
          <div className="flex-[1_1_14rem]">
            <NumberField
              label={`Run ${index + 1}: level after`}
              error={errors[`runs.${index}.end`] ?? errors[`body.runs.${index}.endMl`]}
              value={run.endText}
              onChange={(endText) => type(index + 1, { endText })}
              step={step}
              min={0}
              unit="mL"
            />
          </div>
        </fieldset>
      ))}
      <div className="flex flex-wrap gap-2">
        {draft.runs.length < MAX_RUNS && (
          <>
            <Button onClick={() => edit((now) => addRun(now, false))}>One more on top</Button>
            <Button onClick={() => edit((now) => addRun(now, true))}>One more, emptied</Button>
          </>
        )}
        {draft.runs.length > 1 && (
          <Button onClick={() => edit((now) => ({ ...now, runs: now.runs.slice(0, -1) }))}>
            Take the last run out
          </Button>
        )}
      </div>
    </>
  );
}
