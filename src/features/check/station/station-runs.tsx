import { MAX_RUNS } from "../../../../shared/schemas/entry.ts";
import { Button } from "../../../ui/button.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { changeRun, startTextOf } from "../draft/check-draft.ts";
import type { RunDraft } from "../draft/check-draft-schema.ts";
import { addRun, type QuickDraft } from "../quick/quick-draft.ts";

const USUAL_STEP_ML = 0.1;

interface Props {
  draft: QuickDraft;
  edit: (change: (draft: QuickDraft) => QuickDraft) => void;
  errors: Record<string, string>;
}

/** One level a run: where it started is asked for only where the barrel was emptied before it. */
export function StationRuns({ draft, edit, errors }: Props) {
  return (
    <div className="flex flex-col gap-4">
      {draft.runs.map((run, index) => (
        <StationRun key={index} n={index + 1} run={run} draft={draft} edit={edit} errors={errors} />
      ))}
      <div className="flex flex-wrap gap-2">
        {draft.runs.length < MAX_RUNS && (
          <>
            <Button className="flex-auto" onClick={() => edit((now) => addRun(now, false))}>
              One more on top
            </Button>
            <Button className="flex-auto" onClick={() => edit((now) => addRun(now, true))}>
              One more, emptied
            </Button>
          </>
        )}
      </div>
    </div>
  );
}

function StationRun({ n, run, draft, edit, errors }: Props & { n: number; run: RunDraft }) {
  const startText = startTextOf(draft, n, null);
  const startError = errors[`runs.${n - 1}.start`] ?? errors[`body.runs.${n - 1}.startMl`];
  const step = draft.syringe ? draft.syringe.graduationMl / 2 : USUAL_STEP_ML;
  const type = (typed: Partial<RunDraft>) =>
    edit((now) => ({ ...now, ...changeRun(now, n, typed) }));
  const follows = run.startText === null && !startError;
  return (
    <fieldset className="flex flex-wrap items-end gap-3 border-t border-rule pt-3">
      <legend className="sr-only">Run {n}</legend>
      {!follows && (
        <div className="flex-[1_1_14rem]">
          <NumberField
            label={`Run ${n}: level before`}
            error={startError}
            value={startText}
            onChange={(text) => type({ startText: text })}
            step={step}
            min={0}
            unit="mL"
          />
        </div>
      )}
      <div className="flex-[1_1_14rem]">
        <NumberField
          label={`Run ${n}: level after`}
          hint={follows ? `It started at ${startText || "the level before"} mL.` : undefined}
          error={errors[`runs.${n - 1}.end`] ?? errors[`body.runs.${n - 1}.endMl`]}
          value={run.endText}
          onChange={(endText) => type({ endText })}
          step={step}
          min={0}
          unit="mL"
        />
      </div>
      {follows && <Button onClick={() => type({ startText })}>Another start</Button>}
    </fieldset>
  );
}
