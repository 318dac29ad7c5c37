import { useState } from "react";
import type { Syringe } from "../../../offline/index.ts";
import { changeTestDay } from "../../../offline/test-day.ts";
import { Button } from "../../../ui/button.tsx";
import { Fold } from "../../../ui/fold.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { testDayPath } from "../../../ui/paths.ts";
import { isStop, StopAdvised } from "../../../ui/stop-advised.tsx";
import { TextArea } from "../../../ui/text-area.tsx";
import { Tick } from "../../../ui/tick.tsx";
import { FieldErrors, useSubmit } from "../../../ui/use-submit.ts";
import { CautionsLine } from "../cautions.tsx";
import { isClosedOut } from "../draft/check-draft.ts";
import { planSentence } from "../draft/plan-sentence.ts";
import { saveCheck } from "../draft/save-check.ts";
import { useLiveDraft } from "../draft/use-live-draft.ts";
import { HoursPart } from "../hours-part.tsx";
import { OilTempField } from "../oil-temp-field.tsx";
import { LiveResult } from "../quick/live-result.tsx";
import {
  closeOutAll,
  quickDraftSchema,
  quickEntry,
  quickErrors,
  type QuickDraft,
} from "../quick/quick-draft.ts";
import { UnkeptNotice } from "../unkept-notice.tsx";
import { beginStation, planStation, STATION_FORM, withoutUntouched } from "./station-draft.ts";
import { placeInQueue, type StationProps } from "./station-props.ts";
import { StationRuns } from "./station-runs.tsx";

type Props = StationProps & { syringe: Syringe };

/** Hours and levels on one screen; the syringe is the station's. */
export function StationForm({ syringe, ...station }: Props) {
  const { record } = station.bike;
  const live = useLiveDraft(record.bikeId, STATION_FORM, quickDraftSchema);
  if (!live.ready) return <main className="flex-1" aria-busy />;
  return <Filled {...station} syringe={syringe} live={live} />;
}

function Filled({
  syringe,
  live,
  ...station
}: Props & { live: ReturnType<typeof useLiveDraft<QuickDraft>> }) {
  const { clubId, bike, queued } = station;
  const { record } = bike;
  const { bikeId, details, advice } = record;
  const [untouched] = useState(() => beginStation(record, syringe, new Date().toISOString()));
  const [tried, setTried] = useState(false);
  const draft = { ...(live.draft ?? untouched), syringe };
  const edit = (change: (draft: QuickDraft) => QuickDraft) => live.change(change, untouched);
  const patch = (typed: Partial<QuickDraft>) => edit((now) => ({ ...now, ...typed }));

  const plan = planStation(record, syringe);
  const done = withoutUntouched(draft);
  const entry = quickEntry(done, { bikeId, sequence: details.sequence });
  const found = quickErrors(done);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    setTried(true);
    if (!entry) throw new FieldErrors(found);
    const entryId = await saveCheck(record, entry, { form: STATION_FORM });
    live.forget();
    await changeTestDay(clubId, (now) => ({
      ...now,
      bikes: now.bikes.map((one) => (one.bikeId === bikeId ? { ...one, entryId } : one)),
    }));
  });
  const shown = tried ? { ...errors, ...found } : {};

  return (
    <Page
      title={queued.name}
      back={{ to: testDayPath(clubId), label: "Test day" }}
      action={
        <>
          {problem && <Notice tone="error" title={problem} />}
          {Object.keys(shown).length > 0 && (
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
      {isStop(advice) && <StopAdvised advice={advice} />}
      <UnkeptNotice unkept={live.unkept} />
      <HoursPart record={record} value={draft} onChange={patch} errors={shown} />
      <p>
        {plan.runs !== null && <strong>{runsWords(plan.runs)} </strong>}
        {planSentence(plan, syringe)}
      </p>
      <StationRuns draft={draft} edit={edit} errors={shown} />
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
            error={shown.oilTemp}
            baselineC={record.summary.series.at(-1)?.baseline?.oilTempC ?? null}
          />
          <TextArea
            label="Note"
            hint="May be left empty."
            error={shown["body.note"]}
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
