import { useState } from "react";
import { Button } from "../../../ui/button.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { changeRun } from "../draft/check-draft.ts";
import { LONGEST_SECONDS } from "../draft/run-phase.ts";
import { RunPage } from "./run-page.tsx";
import { useRun } from "./use-run.ts";
import { VoidButtons } from "./void-buttons.tsx";

/** The timer ran on unwatched: only the rider can say how long the pump ticked. */
export function ForgottenRun() {
  const { n, change } = useRun();
  const [text, setText] = useState("");
  const [tried, setTried] = useState(false);
  const seconds = parseDecimal(text);
  const fits = seconds !== null && seconds > 0 && seconds <= LONGEST_SECONDS;
  const keep = () => {
    setTried(true);
    if (fits) change((now) => changeRun(now, n, { seconds }));
  };
  return (
    <RunPage
      action={
        <Button look="primary" wide onClick={keep}>
          It ticked for that long
        </Button>
      }
    >
      <p className="text-lg">
        The timer was never stopped. If you know how long the pump ticked, type it; if not, make
        this run void and do another.
      </p>
      <NumberField
        label="Length of this run"
        hint="From the first tick to the last."
        error={tried && !fits ? `Type the seconds, up to ${LONGEST_SECONDS}.` : undefined}
        value={text}
        onChange={setText}
        step={1}
        min={0}
        unit="s"
      />
      <VoidButtons />
    </RunPage>
  );
}
