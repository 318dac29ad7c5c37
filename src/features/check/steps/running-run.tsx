import { Button } from "../../../ui/button.tsx";
import { changeRun } from "../draft/check-draft.ts";
import { BigTimer } from "./big-timer.tsx";
import { RhythmChoice } from "./rhythm-choice.tsx";
import { RunPage } from "./run-page.tsx";
import { bigActionClass } from "./big-action-class.ts";
import { useArmed } from "./use-armed.ts";
import { useRun } from "./use-run.ts";
import { VoidButtons } from "./void-buttons.tsx";

/** While the pump ticks. */
export function RunningRun({ seconds }: { seconds: number }) {
  const { n, run, change, sequence } = useRun();
  const armed = useArmed();
  const length = run.seconds ?? sequence?.seconds ?? null;
  const stop = () => {
    const ticked = (Date.now() - Date.parse(run.startedAt ?? "")) / 1000;
    change((now) => changeRun(now, n, { seconds: Number(Math.max(0, ticked).toFixed(1)) }));
  };
  return (
    <RunPage
      action={
        <Button look="primary" wide onClick={stop} disabled={!armed} className={bigActionClass}>
          The ticking stopped
        </Button>
      }
    >
      <BigTimer
        seconds={seconds}
        under={length === null ? "seconds" : `of ${length} s`}
        share={length && seconds / length}
      />
      <RhythmChoice />
      <VoidButtons />
    </RunPage>
  );
}
