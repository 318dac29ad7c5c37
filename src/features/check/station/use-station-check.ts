import { useState } from "react";
import type { Syringe } from "../../../offline/index.ts";
import { noteCheck } from "../../../offline/test-day.ts";
import { FieldErrors, useSubmit } from "../../../ui/use-submit.ts";
import { saveCheck } from "../draft/save-check.ts";
import type { LiveDraft } from "../draft/use-live-draft.ts";
import { quickEntry, quickErrors, type QuickDraft } from "../quick/quick-draft.ts";
import { beginStation, STATION_FORM, withoutUntouched } from "./station-draft.ts";
import type { StationProps } from "./station-props.ts";

/** A bike's check at the station, as typed so far, and what saves it. */
export function useStationCheck(
  { clubId, bike: { record } }: StationProps,
  syringe: Syringe,
  live: LiveDraft<QuickDraft>,
) {
  const { bikeId, details } = record;
  const [untouched] = useState(() => beginStation(record, syringe, new Date().toISOString()));
  const [tried, setTried] = useState(false);
  const draft = { ...(live.draft ?? untouched), syringe };
  const edit = (change: (draft: QuickDraft) => QuickDraft) => live.change(change, untouched);
  const done = withoutUntouched(draft);
  const entry = quickEntry(done, { bikeId, sequence: details.sequence });
  const found = quickErrors(done);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    setTried(true);
    if (!entry) throw new FieldErrors(found);
    const entryId = await saveCheck(record, entry, { form: STATION_FORM });
    live.forget();
    await noteCheck(clubId, bikeId, entryId);
  });
  return {
    draft,
    edit,
    patch: (typed: Partial<QuickDraft>) => edit((now) => ({ ...now, ...typed })),
    entry,
    errors: tried ? { ...errors, ...found } : {},
    submit,
    busy,
    problem,
  };
}
