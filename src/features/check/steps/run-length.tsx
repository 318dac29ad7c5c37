import { Fold } from "../../../ui/fold.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { changeRun } from "../draft/check-draft.ts";
import { LONGEST_SECONDS } from "../draft/run-phase.ts";
import { useState } from "react";
import { useRun } from "./use-run.ts";

/** How long the pump ticked, by the timer; to be put right where the timer was late or early. */
export function RunLength() {
  const { run, sequence } = useRun();
  const seconds = run.seconds ?? sequence?.seconds;
  if (seconds === undefined) return null;
  return (
    <Fold title={`It ticked for ${seconds} s`}>
      <SecondsField />
    </Fold>
  );
}

function SecondsField() {
  const { n, run, change, sequence } = useRun();
  const [text, setText] = useState(() => String(run.seconds ?? sequence?.seconds ?? ""));
  const type = (typed: string) => {
    setText(typed);
    const seconds = parseDecimal(typed);
    if (seconds !== null && seconds > 0 && seconds <= LONGEST_SECONDS)
      change((now) => changeRun(now, n, { seconds }));
  };
  return (
    <NumberField
      label="Length of this run"
      hint="From the first tick to the last."
      value={text}
      onChange={type}
      step={1}
      min={0}
      max={LONGEST_SECONDS}
      unit="s"
    />
  );
}
