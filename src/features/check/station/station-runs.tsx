import { useState } from "react";
import { MAX_RUNS } from "../../../../shared/schemas/entry.ts";
import { Button } from "../../../ui/button.tsx";
import { PlusIcon } from "../../../ui/icons.tsx";
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
  const [allStarts, setAllStarts] = useState(false);
  return (
    <div className="flex flex-col gap-3">
      {draft.runs.map((run, index) => (
        <StationRun
          key={index}
          n={index + 1}
          run={run}
          {...{ draft, edit, errors }}
          asksStart={allStarts || run.startText !== null}
        />
      ))}
      {draft.runs.length < MAX_RUNS && (
        <fieldset className="flex min-w-0 flex-wrap gap-2 border-t border-rule pt-3">
          <legend className="sr-only">One more run</legend>
          <Button className="flex-auto px-2!" onClick={() => edit((now) => addRun(now, false))}>
            <PlusIcon />
            Run on top
          </Button>
          <Button className="flex-auto px-2!" onClick={() => edit((now) => addRun(now, true))}>
            <PlusIcon />
            Emptied
          </Button>
        </fieldset>
      )}
      {!allStarts && (
        <button
          type="button"
          onClick={() => setAllStarts(true)}
          className="flex min-h-target items-center self-start font-bold text-oil"
        >
          A run started at another level
        </button>
      )}
    </div>
  );
}

interface RunProps extends Props {
  n: number;
  run: RunDraft;
  asksStart: boolean;
}

function StationRun({ n, run, asksStart, draft, edit, errors }: RunProps) {
  const startText = startTextOf(draft, n, null);
  const startError = errors[`runs.${n - 1}.start`] ?? errors[`body.runs.${n - 1}.startMl`];
  const step = draft.syringe ? draft.syringe.graduationMl / 2 : USUAL_STEP_ML;
  const type = (typed: Partial<RunDraft>) =>
    edit((now) => ({ ...now, ...changeRun(now, n, typed) }));
  const from = startText ? `From ${startText}\u00a0mL.` : `From where run ${n - 1} ended.`;
  const asks = asksStart || startError !== undefined;
  return (
    <fieldset className="flex flex-wrap gap-3 border-t border-rule pt-3">
      <legend className="sr-only">Run {n}</legend>
      {asks && (
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
          hint={asks ? undefined : from}
          error={errors[`runs.${n - 1}.end`] ?? errors[`body.runs.${n - 1}.endMl`]}
          value={run.endText}
          onChange={(endText) => type({ endText })}
          step={step}
          min={0}
          unit="mL"
        />
      </div>
    </fieldset>
  );
}
