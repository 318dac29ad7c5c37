import { useState } from "react";
import { AdviceChoice } from "./advice-choice.tsx";
import { EntryForm } from "./entry-form.tsx";
import type { EntryFormProps } from "./entry-form-props.ts";
import { NoteField } from "./note-field.tsx";

export function NoteForm({ record, mends }: EntryFormProps<"note">) {
  const [text, setText] = useState(mends?.body.text ?? "");
  const [advice, setAdvice] = useState(mends?.body.advice);
  return (
    <EntryForm
      title="Write a note"
      record={record}
      mends={mends}
      hoursHint="May be left empty."
      makeEntry={(common) => ({
        ...common,
        kind: "note",
        body: { text: text.trim(), advice },
      })}
    >
      {(errors) => (
        <>
          <NoteField
            label="What is worth keeping?"
            hint="A sound, a smell, smoke, who rode it."
            value={text}
            onChange={setText}
            error={errors["body.text"]}
          />
          <AdviceChoice record={record} value={advice} onChange={setAdvice} />
        </>
      )}
    </EntryForm>
  );
}
