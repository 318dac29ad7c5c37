import type { Syringe } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Fold } from "../../../ui/fold.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { testDayPath } from "../../../ui/paths.ts";
import { isStop, StopAdvised } from "../../../ui/stop-advised.tsx";
import { TextArea } from "../../../ui/text-area.tsx";
import { Tick } from "../../../ui/tick.tsx";
import { CautionsLine } from "../cautions.tsx";
import { isClosedOut, meanReadMl } from "../draft/check-draft.ts";
import { planSentence } from "../draft/plan-sentence.ts";
import { useLiveDraft, type LiveDraft } from "../draft/use-live-draft.ts";
import { HoursPart } from "../hours-part.tsx";
import { OilTempField } from "../oil-temp-field.tsx";
import { LiveResult } from "../quick/live-result.tsx";
import { closeOutAll, quickDraftSchema, type QuickDraft } from "../quick/quick-draft.ts";
import { UnkeptNotice } from "../unkept-notice.tsx";
import { planStation, STATION_FORM } from "./station-draft.ts";
import { placeInQueue, type StationProps } from "./station-props.ts";
import { StationRuns } from "./station-runs.tsx";
import { useStationCheck } from "./use-station-check.ts";

type Props = StationProps & { syringe: Syringe };

/** Hours and levels on one screen; the syringe is the station's. */
export function StationForm(props: Props) {
  const live = useLiveDraft(props.bike.record.bikeId, STATION_FORM, quickDraftSchema);
  if (!live.ready) return <main className="flex-1" aria-busy />;
  return <Fields {...props} live={live} />;
}

function Fields({ syringe, live, ...station }: Props & { live: LiveDraft<QuickDraft> }) {
  const { clubId, queued, bike } = station;
  const { record } = bike;
  const check = useStationCheck(station, syringe, live);
  const { draft, edit, patch, entry, errors, submit, busy, problem } = check;
  const plan = planStation(record, syringe, meanReadMl(draft));
  return (
    <Page
      title={queued.name}
      back={{ to: testDayPath(clubId), label: "Test day" }}
      action={
        <>
          {problem && <Notice tone="error" title={problem} />}
          {Object.keys(errors).length > 0 && (
            <p role="alert" className="font-bold text-low">
              Not saved yet: look at what is marked above.
            </p>
          )}
          <Button look="primary" wide disabled={busy} onClick={() => void submit()}>
            Save the check
          </Button>
        </>
      }
    >
      <p className="-mt-3 text-soft">{placeInQueue(station)}</p>
      {isStop(record.advice) && <StopAdvised advice={record.advice} />}
      <UnkeptNotice unkept={live.unkept} />
      <HoursPart record={record} value={draft} onChange={patch} errors={errors} />
      <p>
        {plan.runs !== null && <strong>{runsWords(plan.runs)} </strong>}
        {planSentence(plan, syringe)}
      </p>
      <StationRuns draft={draft} edit={edit} errors={errors} />
      <Tick
        checked={isClosedOut(draft.closeOut)}
        onChange={(on) => patch({ closeOut: closeOutAll(on) })}
      >
        <strong className="block">Closed out</strong>
        Test lead out, hose on and clipped, line free of bubbles, no leaks, smoke as usual.
      </Tick>
      <LiveResult record={record} entry={entry} />
      <Fold title="Oil temperature and note">
        <div className="flex flex-col gap-4">
          <OilTempField
            value={draft.oilTempText}
            onChange={(oilTempText) => patch({ oilTempText })}
            error={errors.oilTemp}
            baselineC={record.summary.series.at(-1)?.baseline?.oilTempC ?? null}
          />
          <TextArea
            label="Note"
            hint="May be left empty."
            error={errors["body.note"]}
            value={draft.note}
            onChange={(event) => patch({ note: event.target.value })}
          />
        </div>
      </Fold>
      <CautionsLine />
    </Page>
  );
}

const runsWords = (runs: number) => (runs === 1 ? "1 run." : `${runs} runs.`);
