import { useState } from "react";
import { z } from "zod";
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
const draftSchema = z.object({ ids: z.array(z.string()), startsSeries: z.boolean().nullable() });

interface Props {
  record: BikeRecord;
  /** What the meter showed at the check. */
  checkHours: number;
}

/** Where to look for the cause, in order; what was done becomes one entry of work. */
export function WhatNext({ record, checkHours }: Props) {
  const { bikeId, summary } = record;
  const live = useLiveDraft(bikeId, FORM, draftSchema);
  const { ids, startsSeries } = live.draft ?? { ids: [], startsSeries: null };
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
        hours: now === null ? checkHours : now - displayOffset,
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
      <TickGroup
        label="Tick what you have done"
        hint="Then check again: the old baseline tells whether the cure worked."
        options={causes.map(({ id, line }, index) => ({
          value: id,
          label: `${index + 1}. ${line}`,
        }))}
        chosen={ids}
        onChange={(chosen) => live.set({ ids: chosen, startsSeries })}
      />
      {resets && (
        <Tick checked={startsSeries ?? true} onChange={(on) => live.set({ ids, startsSeries: on })}>
          <strong>Start a new baseline:</strong> the pump gives something else from here on
        </Tick>
      )}
      <ProblemList errors={errors} problem={problem} />
      {written && <p role="status">Written in the log: saved on this phone.</p>}
      {ids.length > 0 && (
        <Button look="primary" disabled={busy} onClick={() => void submit()}>
          Write it in the log
        </Button>
      )}
      <Premix />
    </section>
  );
}
