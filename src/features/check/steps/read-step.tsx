import { useState } from "react";
import { Navigate, useNavigate } from "react-router-dom";
import { Button } from "../../../ui/button.tsx";
import { Fold } from "../../../ui/fold.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { Page } from "../../../ui/page.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { furthestStep } from "../check-paths.ts";
import { changeRun, startTextOf, chooseSpoilers } from "../draft/check-draft.ts";
import { levelErrors } from "../draft/level-errors.ts";
import { SpoilerTicks } from "../spoiler-ticks.tsx";
import { LevelField } from "./level-field.tsx";
import { StepProgress } from "./step-progress.tsx";
import { UnkeptNotice } from "../unkept-notice.tsx";
import { useRun } from "./use-run.ts";
import { useWakeLock } from "./use-wake-lock.ts";

/** While reading these go wrong. */
const whileReading = [
  "hose-in-oil",
  "eye-off-level",
  "tip-leaked",
  "oil-film",
  "drip-wait-varied",
] as const;

/** Marks assumed where the syringe is not known. */
const unknownSyringe = { capacityMl: 5, graduationMl: 0.2 };

export function ReadStep() {
  const { n, exists, run, draft, change, paths, name, unkept } = useRun();
  const navigate = useNavigate();
  const [tried, setTried] = useState(false);
  useWakeLock();
  if (!exists) return <Navigate to={furthestStep(paths, draft)} replace />;
  const syringe = draft.syringe ?? unknownSyringe;
  const startText = startTextOf(draft, n, null);
  const found = levelErrors({ startText, endText: run.endText }, draft.syringe);
  const errors = tried ? found : {};
  const goOn = () => {
    setTried(true);
    if (Object.keys(found).length === 0) void navigate(paths.again(n));
  };
  const startField = (
    <NumberField
      label="Level before the run"
      error={errors.start}
      value={startText}
      onChange={(text) => change((now) => changeRun(now, n, { startText: text }))}
      step={syringe.graduationMl / 2}
      min={0}
      unit="mL"
    />
  );
  return (
    <Page
      title={`Read the level, ${name.toLowerCase()}`}
      back={{ to: paths.run(n), label: name }}
      action={
        <Button look="primary" wide onClick={goOn}>
          That is the level
        </Button>
      }
    >
      <StepProgress at="Read" />
      <UnkeptNotice unkept={unkept} />
      <LevelField
        label="Level after the run"
        hint="Eye level with the oil, at the bottom of its curve; the hose clear of the oil."
        error={errors.end}
        syringe={syringe}
        startMl={parseDecimal(startText)}
        value={run.endText}
        onChange={(endText) => change((now) => changeRun(now, n, { endText }))}
      />
      {errors.start ? (
        startField
      ) : (
        <Fold title={`It started at ${startText} mL`}>{startField}</Fold>
      )}
      <SpoilerTicks
        title="Something spoiled this reading"
        offered={whileReading}
        chosen={draft.spoilers}
        onChange={(offered, chosen) => change((now) => chooseSpoilers(now, offered, chosen))}
      />
    </Page>
  );
}
