import { useNavigate } from "react-router-dom";
import { Button } from "../../../ui/button.tsx";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { chooseSpoilers } from "../draft/check-draft.ts";
import { DRIP_SECONDS } from "../draft/run-phase.ts";
import { BigTimer } from "./big-timer.tsx";
import { RhythmChoice } from "./rhythm-choice.tsx";
import { RunLength } from "./run-length.tsx";
import { RunPage } from "./run-page.tsx";
import { SoundSwitch } from "./sound-switch.tsx";
import { bigActionClass } from "./big-action-class.ts";
import { useArmed } from "./use-armed.ts";
import { useRun } from "./use-run.ts";
import { VoidButtons } from "./void-buttons.tsx";

/** What reading before the wait is over does to a check. */
const EARLY = ["drip-wait-varied"] as const;

/** After the pump stopped: the last drops fall, always for as long. */
export function DrippingRun({ secondsLeft }: { secondsLeft: number }) {
  const { n, change, paths } = useRun();
  const navigate = useNavigate();
  const armed = useArmed();
  const waits = secondsLeft > 0;
  const readEarly = () => {
    change((now) => chooseSpoilers(now, EARLY, EARLY));
    void navigate(paths.read(n));
  };
  return (
    <RunPage
      action={
        waits ? (
          <Button wide disabled={!armed} onClick={readEarly}>
            Read now: marked as too early
          </Button>
        ) : (
          <ButtonLink look="primary" wide to={paths.read(n)} className={bigActionClass}>
            Read the level
          </ButtonLink>
        )
      }
    >
      {waits ? (
        <BigTimer
          seconds={Math.ceil(secondsLeft)}
          under="s to wait for the last drops"
          share={1 - secondsLeft / DRIP_SECONDS}
        />
      ) : (
        <p role="status" className="text-3xl leading-tight font-bold">
          The last drops have fallen. Take the hose clear of the oil.
        </p>
      )}
      <RunLength />
      <RhythmChoice />
      <VoidButtons />
      <SoundSwitch />
    </RunPage>
  );
}
