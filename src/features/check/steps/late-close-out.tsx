import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { CHECK_FORM, saveEntry, type BikeRecord } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { formatHours } from "../../../ui/format-hours.ts";
import { HoursField } from "../../../ui/hours-field.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { parseHours } from "../../../ui/parse-hours.ts";
import { bikePath } from "../../../ui/paths.ts";
import { FieldErrors, useSubmit } from "../../../ui/use-submit.ts";
import { CloseOutTicks } from "../close-out-ticks.tsx";
import { isClosedOut } from "../draft/check-draft.ts";
import type { CloseOutItem } from "../draft/check-draft-schema.ts";
import { draftsWritten } from "../draft/use-live-draft.ts";
import { ProblemList } from "../problem-list.tsx";

interface Props {
  record: BikeRecord;
  onClosed: () => void;
}

/** The close-out of a check that was saved or given up without it: one entry of work done. */
export function LateCloseOut({ record, onClosed }: Props) {
  const { bikeId, details, summary } = record;
  const { now, displayOffset } = summary.hours;
  // Not kept over a reload: an old tick must never stand for what was not looked at today.
  const [done, setDone] = useState<CloseOutItem[]>([]);
  const [hours, setHours] = useState(() =>
    now === null ? "" : formatHours(now - displayOffset, details.meterFormat),
  );
  const navigate = useNavigate();
  const { submit, busy, errors, problem } = useSubmit(async () => {
    if (!isClosedOut(done)) throw new FieldErrors({ ticks: "Tick all five first." });
    const read = parseHours(hours);
    if (read === null)
      throw new FieldErrors({ hours: "Type the engine hours as the meter shows them." });
    await draftsWritten();
    await saveEntry(
      {
        bikeId,
        kind: "work",
        at: new Date().toISOString(),
        hours: read,
        body: {
          items: ["line-bled"],
          startsSeries: false,
          note: "Close-out after a delivery check.",
        },
      },
      { draft: { bikeId, form: CHECK_FORM } },
    );
    onClosed();
    await navigate(bikePath(bikeId), { replace: true });
  });
  return (
    <Page
      title="Close-out"
      back={{ to: bikePath(bikeId), label: details.name }}
      action={
        <Button look="primary" wide disabled={busy} onClick={() => void submit()}>
          Save the close-out
        </Button>
      }
    >
      <Notice tone="error" title="Hose may be off: do not start">
        <p>A check was left without its close-out. This goes when all five are ticked and saved.</p>
      </Notice>
      <CloseOutTicks chosen={done} onChange={setDone} />
      <HoursField
        label="Engine hours"
        error={errors.hours}
        meterFormat={details.meterFormat}
        value={hours}
        onChange={setHours}
      />
      <ProblemList errors={errors} problem={problem} />
    </Page>
  );
}
