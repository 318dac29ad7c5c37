import { useState } from "react";
import { workItems, type WorkItem } from "../../../../shared/schemas/entry.ts";
import { Tick } from "../../../ui/tick.tsx";
import { workWords } from "../../../ui/work-words.ts";
import { EntryForm } from "./entry-form.tsx";
import type { EntryFormProps } from "./entry-form-props.ts";
import { NoteField } from "./note-field.tsx";
import { proposesSeries, seriesAdvice } from "./propose-series.ts";
import { TickGroup } from "../../../ui/tick-group.tsx";
import { optionalText } from "./typed-values.ts";

export function WorkForm({ record, mends }: EntryFormProps<"work">) {
  const [items, setItems] = useState<WorkItem[]>(mends?.body.items ?? []);
  /** Null until the rider decides: then the work itself proposes. */
  const [decided, setDecided] = useState<boolean | null>(mends?.body.startsSeries ?? null);
  const [note, setNote] = useState(mends?.body.note ?? "");
  const startsSeries = decided ?? proposesSeries(items);
  return (
    <EntryForm
      title="Log work"
      record={record}
      mends={mends}
      makeEntry={({ hours, ...common }) => ({
        ...common,
        kind: "work",
        hours: hours ?? NaN,
        body: { items, startsSeries, note: optionalText(note) },
      })}
    >
      {(errors) => (
        <>
          <TickGroup
            label="What was done"
            error={errors["body.items"]}
            options={workItems.map((value) => ({ value, label: workWords[value] }))}
            chosen={items}
            onChange={setItems}
          />
          <div className="border-y border-rule py-2">
            <Tick checked={startsSeries} onChange={setDecided}>
              <strong>Starts a new baseline</strong>
            </Tick>
            <p className="text-soft">{seriesAdvice(items)}</p>
          </div>
          <NoteField value={note} onChange={setNote} error={errors["body.note"]} />
        </>
      )}
    </EntryForm>
  );
}
