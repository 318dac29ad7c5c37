import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { Button } from "../../../ui/button.tsx";
import { Page } from "../../../ui/page.tsx";
import { CautionsLine } from "../cautions.tsx";
import { setUpErrors } from "../draft/set-up-errors.ts";
import { chooseSpoilers, nextRun } from "../draft/check-draft.ts";
import { useOpenCheck } from "../open-check.ts";
import { HoursPart } from "../hours-part.tsx";
import { OilTempField } from "../oil-temp-field.tsx";
import { RunsNeeded } from "./runs-needed.tsx";
import { SequencePart } from "./sequence-part.tsx";
import { SpoilerTicks } from "../spoiler-ticks.tsx";
import { StepProgress } from "./step-progress.tsx";
import { SyringePart } from "./syringe-part.tsx";
import { UnkeptNotice } from "../unkept-notice.tsx";

/** Before a run these can still be put right. */
const beforeRun = [
  "barrel-not-upright",
  "bubbles",
  "cold-oil",
  "weak-battery",
  "low-tank",
] as const;

export function SetUpStep() {
  const { draft, change, paths, record, unkept } = useOpenCheck();
  const navigate = useNavigate();
  const [tried, setTried] = useState(false);
  const errors = tried ? setUpErrors(draft) : {};
  const goOn = () => {
    setTried(true);
    if (Object.keys(setUpErrors(draft)).length === 0) void navigate(paths.run(nextRun(draft)));
  };
  return (
    <Page
      title="Set up"
      back={{ to: paths.start, label: record.details.name }}
      action={
        <Button look="primary" wide onClick={goOn}>
          Go to run {nextRun(draft)}
        </Button>
      }
    >
      <StepProgress at="Set up" />
      <UnkeptNotice unkept={unkept} />
      <CautionsLine />
      <SyringePart error={errors.syringe} />
      <RunsNeeded />
      <HoursPart
        record={record}
        value={draft}
        onChange={(typed) => change((now) => ({ ...now, ...typed }))}
        errors={errors}
      />
      <SequencePart />
      <OilTempField
        baselineC={record.summary.series.at(-1)?.baseline?.oilTempC ?? null}
        value={draft.oilTempText}
        onChange={(oilTempText) => change((now) => ({ ...now, oilTempText }))}
        error={errors.oilTemp}
      />
      <SpoilerTicks
        title="What spoils a reading"
        offered={beforeRun}
        chosen={draft.spoilers}
        onChange={(offered, chosen) => change((now) => chooseSpoilers(now, offered, chosen))}
      />
    </Page>
  );
}
