import { useState } from "react";
import { Button } from "../../../ui/button.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { unlockSound } from "../alarm.ts";
import { CautionsLine } from "../cautions.tsx";
import { changeRun, startRun, startTextOf } from "../draft/check-draft.ts";
import { RunPage } from "./run-page.tsx";
import { SoundSwitch } from "./sound-switch.tsx";
import { bigActionClass } from "./big-action-class.ts";
import { useArmed } from "./use-armed.ts";
import { useRun } from "./use-run.ts";
import { VoidButtons } from "./void-buttons.tsx";

/** Before the pump ticks: the start level is read, and one big button waits for the first tick. */
export function ReadyRun() {
  const { n, draft, change, nextMl, sequence } = useRun();
  const [tried, setTried] = useState(false);
  const armed = useArmed();
  const startText = startTextOf(draft, n, nextMl);
  const known = parseDecimal(startText) !== null;
  const start = () => {
    setTried(true);
    if (!known) return;
    unlockSound();
    change((now) => startRun(now, n, new Date().toISOString()));
  };
  return (
    <RunPage
      action={
        <Button look="primary" wide onClick={start} disabled={!armed} className={bigActionClass}>
          Start
        </Button>
      }
    >
      <CautionsLine />
      <NumberField
        label="Level before the run"
        hint={startHint(n, startText)}
        error={tried && !known ? "Read the level in the barrel first." : undefined}
        value={startText}
        onChange={(text) => change((now) => changeRun(now, n, { startText: text }))}
        step={(draft.syringe?.graduationMl ?? 0.2) / 2}
        min={0}
        unit="mL"
      />
      <ol className="list-decimal pl-6 text-lg">
        <li>Hold the hose over the barrel, clear of the oil.</li>
        <li>Trigger the priming sequence as the bike’s manual says.</li>
        <li>
          Press Start at the first tick.{" "}
          {sequence
            ? `The timer stops by itself after ${sequence.seconds} s.`
            : "Press again when it stops."}
        </li>
      </ol>
      <SoundSwitch />
      <VoidButtons only={["not-started"]} />
    </RunPage>
  );
}

function startHint(n: number, startText: string): string {
  if (n === 1)
    return "Fill the tip with oil up to a mark: what is below the first mark is not seen.";
  if (startText === "")
    return "Empty the barrel: there is no room for one more run. A film stays in it, so read the level anew.";
  return "Going on from the last end. If you emptied the barrel, read the level anew.";
}
