import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { BikeRecord, Syringe } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { TextArea } from "../../../ui/text-area.tsx";
import { Tick } from "../../../ui/tick.tsx";
import { FieldErrors, useSubmit } from "../../../ui/use-submit.ts";
import { CautionsLine } from "../cautions.tsx";
import { stepPaths } from "../check-paths.ts";
import { isClosedOut } from "../draft/check-draft.ts";
import { saveCheck } from "../draft/save-check.ts";
import type { LiveDraft } from "../draft/use-live-draft.ts";
import { HoursPart } from "../hours-part.tsx";
import { OilTempField } from "../oil-temp-field.tsx";
import { UnkeptNotice } from "../unkept-notice.tsx";
import { LiveResult } from "./live-result.tsx";
import {
  closeOutAll,
  QUICK_FORM,
  quickEntry,
  quickErrors,
  type QuickDraft,
} from "./quick-draft.ts";
import { QuickRuns } from "./quick-runs.tsx";
import { QuickSyringe } from "./quick-syringe.tsx";
import { ResumedNotice } from "./resumed-notice.tsx";

interface Props {
  record: BikeRecord;
  live: LiveDraft<QuickDraft>;
  begin: () => QuickDraft;
  syringes: Syringe[];
}

export function QuickForm({ record, live, begin, syringes }: Props) {
  const { bikeId, details } = record;
  const paths = stepPaths(bikeId);
  const navigate = useNavigate();
  const [untouched] = useState(begin);
  const [resumed, setResumed] = useState(live.draft !== null);
  const [tried, setTried] = useState(false);
  const draft = live.draft ?? untouched;
  const edit = (change: (draft: QuickDraft) => QuickDraft) => live.change(change, untouched);
  const patch = (typed: Partial<QuickDraft>) => edit((now) => ({ ...now, ...typed }));

  const entry = quickEntry(draft, { bikeId, sequence: details.sequence });
  const found = quickErrors(draft);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    setTried(true);
    if (!entry) throw new FieldErrors(found);
    const entryId = await saveCheck(record, entry, { form: QUICK_FORM });
    live.forget();
    await navigate(paths.result(entryId), { replace: true });
  });
  const shown = tried ? { ...errors, ...found } : {};

  return (
    <Page
      title="Quick form"
      back={{ to: paths.start, label: "Delivery check" }}
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
      <UnkeptNotice unkept={live.unkept} />
      <CautionsLine />
      {resumed && live.draft && (
        <ResumedNotice
          at={draft.at}
          onStartAfresh={() => {
            live.set(null);
            setResumed(false);
          }}
        />
      )}
      <HoursPart record={record} value={draft} onChange={patch} errors={shown} />
      <QuickSyringe
        syringes={syringes}
        value={draft.syringe}
        onChange={(syringe) => patch({ syringe })}
      />
      <QuickRuns draft={draft} edit={edit} errors={shown} />
      <OilTempField
        baselineC={record.summary.series.at(-1)?.baseline?.oilTempC ?? null}
        value={draft.oilTempText}
        onChange={(oilTempText) => patch({ oilTempText })}
        error={shown.oilTemp ?? shown["body.oilTempC"]}
      />
      <TextArea
        label="Note"
        hint="May be left empty."
        error={shown["body.note"]}
        value={draft.note}
        onChange={(event) => patch({ note: event.target.value })}
      />
      <Tick
        checked={isClosedOut(draft.closeOut)}
        onChange={(on) => patch({ closeOut: closeOutAll(on) })}
      >
        <strong className="block">Closed out</strong>
        Test lead out, hose on and clipped, line free of bubbles, no leaks, smoke as usual.
      </Tick>
      <LiveResult record={record} entry={entry} />
    </Page>
  );
}
