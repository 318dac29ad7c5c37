import { useState } from "react";
import { z } from "zod";
import type { LogEntryOf } from "../../../../shared/schemas/entry.ts";
import { saveEntry, type BikeRecord } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { TickGroup } from "../../../ui/tick-group.tsx";
import { Tick } from "../../../ui/tick.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { draftsWritten, useLiveDraft } from "../draft/use-live-draft.ts";
import { ProblemList } from "../problem-list.tsx";
import { causes, chosenCauses, workBody } from "./causes.ts";
import { Premix } from "./premix.tsx";

/** The form under which the ticks are kept until they are written down. */
const FORM = "causes";
const draftSchema = z.object({
  entryId: z.string(),
  ids: z.array(z.string()),
  startsSeries: z.boolean().nullable(),
});

interface Props {
  record: BikeRecord;
  check: LogEntryOf<"check">;
  /** The close-out comes first: nothing is written down before it. */
  hoseMaybeOff: boolean;
}

/** Where to look for the cause, in order; what was done becomes one entry of work. */
export function WhatNext({ record, check, hoseMaybeOff }: Props) {
  const { bikeId, summary } = record;
  const live = useLiveDraft(bikeId, FORM, draftSchema);
  // What was ticked after an earlier check, and never written down, is of that check.
  const nothing = { entryId: check.id, ids: [], startsSeries: null };
  const { ids, startsSeries } = live.draft?.entryId === check.id ? live.draft : nothing;
  const resets = chosenCauses(ids).some((cause) => cause.resets);
  const [written, setWritten] = useState(false);
  const { now, displayOffset } = summary.hours;
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await draftsWritten();
    await saveEntry(
      {
        bikeId,
        kind: "work",
        at: new Date().toISOString(),
        hours: now === null ? check.hours : now - displayOffset,
        body: workBody(ids, resets && (startsSeries ?? true)),
      },
      { draft: { bikeId, form: FORM } },
    );
    live.forget();
    setWritten(true);
  });
  return (
    <section aria-labelledby="what-next" className="flex flex-col gap-3 border-t border-rule pt-4">
      <h2 id="what-next" className="text-xl">
        What to do next, in this order
      </h2>
      {hoseMaybeOff && (
        <p className="font-bold">
          Close the check out first. What you tick here is kept; it can be written in the log once
          that is done.
        </p>
      )}
      <TickGroup
        label="Tick what you have done"
        hint="Then check again: the old baseline tells whether the cure worked."
        options={causes.map(({ id, line }, index) => ({
          value: id,
          label: `${index + 1}. ${line}`,
        }))}
        chosen={ids}
        onChange={(chosen) => live.set({ entryId: check.id, ids: chosen, startsSeries })}
      />
      {resets && (
        <Tick
          checked={startsSeries ?? true}
          onChange={(on) => live.set({ entryId: check.id, ids, startsSeries: on })}
        >
          <strong>Start a new baseline:</strong> the pump gives something else from here on
        </Tick>
      )}
      <ProblemList errors={errors} problem={problem} />
      {written && <p role="status">Written in the log: saved on this phone.</p>}
      {ids.length > 0 && !hoseMaybeOff && (
        <Button look="primary" disabled={busy} onClick={() => void submit()}>
          Write it in the log
        </Button>
      )}
      <Premix />
    </section>
  );
}
