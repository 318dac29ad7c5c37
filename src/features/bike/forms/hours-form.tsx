import { useState } from "react";
import { Tick } from "../../../ui/tick.tsx";
import { EntryForm } from "./entry-form.tsx";
import type { EntryFormProps } from "./entry-form-props.ts";
import { NoteField } from "./note-field.tsx";
import { optionalText } from "./typed-values.ts";

export function HoursForm({ record, mends }: EntryFormProps<"hours">) {
  const { estimated: wasEstimated, confirms } = mends?.body ?? {};
  const [estimated, setEstimated] = useState(wasEstimated ?? record.details.meter === "estimated");
  const [note, setNote] = useState(mends?.body.note ?? "");
  return (
    <EntryForm
      title="Log hours"
      record={record}
      mends={mends}
      hoursFirst
      makeEntry={({ hours, ...common }) => ({
        ...common,
        kind: "hours",
        hours: hours ?? NaN,
        body: { estimated: estimated || undefined, confirms, note: optionalText(note) },
      })}
    >
      {(errors) => (
        <>
          <Tick checked={estimated} onChange={setEstimated}>
            This is an estimate
          </Tick>
          <NoteField value={note} onChange={setNote} error={errors["body.note"]} />
        </>
      )}
    </EntryForm>
  );
}
