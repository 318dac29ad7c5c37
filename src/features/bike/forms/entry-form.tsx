import { useState, type ReactNode } from "react";
import { useLocation, useNavigate } from "react-router-dom";
import type { LogEntry } from "../../../../shared/schemas/entry.ts";
import {
  saveEntry,
  useHoldUpdates,
  type BikeRecord,
  type NewEntry,
} from "../../../offline/index.ts";
import { AskAboutGain } from "../../../ui/ask-about-gain.tsx";
import { Button } from "../../../ui/button.tsx";
import { DateTimeField } from "../../../ui/date-time-field.tsx";
import { Form } from "../../../ui/form.tsx";
import { formatHours } from "../../../ui/format-hours.ts";
import { HoursField } from "../../../ui/hours-field.tsx";
import { Page } from "../../../ui/page.tsx";
import { bikePath } from "../../../ui/paths.ts";
import { useSubmit } from "../../../ui/use-submit.ts";
import { typedHours } from "./typed-values.ts";

/** When it happened, and what the meter showed. */
export interface WhenAndHours {
  bikeId: string;
  at: string;
  hours: number | null;
}

interface Props {
  title: string;
  record: BikeRecord;
  /** The refused entry that this one is written in place of. */
  mends: LogEntry | null;
  makeEntry: (common: WhenAndHours) => NewEntry;
  hoursLabel?: string;
  hoursHint?: string;
  /** The hours are what this form is about. */
  hoursFirst?: boolean;
  children: (errors: Record<string, string>) => ReactNode;
}

/** What every form of the log shares: when, at what hours, saving, and the way back. */
export function EntryForm(props: Props) {
  useHoldUpdates();
  const { title, record, mends, makeEntry, hoursLabel = "Engine hours", hoursHint } = props;
  const { bikeId, details, summary } = record;
  const navigate = useNavigate();
  const back = useBack(record);
  const [at, setAt] = useState(() => mends?.at ?? new Date().toISOString());
  const [hours, setHours] = useState(() => proposedHours(record, mends));
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await saveEntry(makeEntry({ bikeId, at, hours: typedHours(hours) }));
    if (mends) await strikeMended(mends);
    await navigate(back.to, { replace: true, state: { saved: true } });
  });
  const hoursField = (
    <div>
      <HoursField
        label={hoursLabel}
        hint={hoursHint ?? lastReadingWords(summary, details)}
        error={errors.hours}
        value={hours}
        onChange={setHours}
        meterFormat={details.meterFormat}
        large={props.hoursFirst}
      />
      <AskAboutGain hours={summary.hours} text={hours} at={at} />
    </div>
  );

  return (
    <Page
      title={title}
      back={back}
      action={
        <Button type="submit" form="entry" look="primary" wide disabled={busy}>
          Save
        </Button>
      }
    >
      <Form id="entry" onSubmit={submit} problem={problem ?? errors.bikeId ?? null}>
        {props.hoursFirst && hoursField}
        {props.children(errors)}
        {!props.hoursFirst && hoursField}
        <DateTimeField label="When" value={at} onChange={setAt} error={errors.at} />
      </Form>
    </Page>
  );
}

/** To the bike, or to where the form was opened from. */
function useBack({ bikeId, details }: BikeRecord): { to: string; label: string } {
  const state = useLocation().state as { back?: { to: string; label: string } } | null;
  return state?.back ?? { to: bikePath(bikeId), label: details.name };
}

/** As the meter showed at the last reading; an entry written anew starts from its own. */
function proposedHours({ summary, details }: BikeRecord, mends: LogEntry | null): string {
  const { now, displayOffset } = summary.hours;
  const last = now === null ? null : now - displayOffset;
  const hours = mends ? mends.hours : last;
  return hours === null ? "" : formatHours(hours, details.meterFormat);
}

function lastReadingWords(
  { hours: { now, displayOffset } }: BikeRecord["summary"],
  { meterFormat }: BikeRecord["details"],
): string {
  return now === null
    ? "What the meter showed."
    : `Last reading: ${formatHours(now - displayOffset, meterFormat)}\u00a0h.`;
}

/** Should this fail, the refused entry merely stays in sight as it was. */
async function strikeMended({ id, bikeId }: LogEntry): Promise<void> {
  const strike: NewEntry = {
    bikeId,
    kind: "strike",
    at: new Date().toISOString(),
    hours: null,
    body: { entryId: id, reason: "Not accepted by the server, and written anew." },
  };
  await saveEntry(strike).catch(() => undefined);
}
