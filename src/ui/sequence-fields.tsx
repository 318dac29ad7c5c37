import { usualSequences } from "../../shared/delivery/usual-sequences.ts";
import type { BikeFormPart } from "./bike-form.ts";
import { Choice } from "./choice.tsx";
import { NumberField } from "./number-field.tsx";
import { sequenceWords } from "./sequence-words.ts";

/** What the bike does when its oil pump is primed; not knowing it is no obstacle. */
export function SequenceFields({ form, set, errors }: BikeFormPart) {
  return (
    <>
      <Choice
        label="Priming sequence"
        hint="The first run of a check finds it out, where you do not know it."
        stacked
        options={[
          { value: "unknown", label: "Not known" },
          ...usualSequences.map((usual) => ({
            value: usual.id,
            label: sequenceWords(usual),
            hint: `Delivers about ${usual.nominalMl}\u00a0mL.`,
          })),
          { value: "own", label: "Another" },
        ]}
        value={form.sequence}
        onChange={(sequence) => set({ sequence })}
      />
      {form.sequence === "own" && (
        <>
          <NumberField
            label="Length of the sequence"
            error={errors["body.sequence.seconds"]}
            value={form.ownSeconds}
            onChange={(ownSeconds) => set({ ownSeconds })}
            step={5}
            min={0}
            unit="s"
          />
          <Choice
            label="The pump ticks at"
            stacked
            options={[
              { value: "steady", label: "One fast rate" },
              { value: "alternating", label: "Slow and fast in turn" },
            ]}
            value={form.ownRhythm}
            onChange={(ownRhythm) => set({ ownRhythm })}
          />
          <NumberField
            label="Usual delivery"
            hint="May be left empty."
            error={errors["body.sequence.nominalMl"]}
            value={form.ownMl}
            onChange={(ownMl) => set({ ownMl })}
            step={0.1}
            min={0}
            unit="mL"
          />
        </>
      )}
    </>
  );
}
