import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { v7 as uuidv7 } from "uuid";
import { saveEntry, useHoldUpdates } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Fold } from "../../ui/fold.tsx";
import { Form } from "../../ui/form.tsx";
import { HoursField } from "../../ui/hours-field.tsx";
import { IntervalFields } from "../../ui/interval-fields.tsx";
import { MakeFields } from "../../ui/make-fields.tsx";
import { MeterFields } from "../../ui/meter-fields.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { SequenceFields } from "../../ui/sequence-fields.tsx";
import { TextField } from "../../ui/text-field.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { emptyForm, newBikeEntry, type NewBikeForm } from "./new-bike-entry.ts";

/** A name is enough; whatever else is known makes the first check easier. */
export default function NewBikePage() {
  useHoldUpdates();
  const navigate = useNavigate();
  const [bikeId] = useState(() => uuidv7());
  const [form, setForm] = useState(emptyForm);
  const set = (change: Partial<NewBikeForm>) => setForm((before) => ({ ...before, ...change }));
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await saveEntry(newBikeEntry(form, bikeId, new Date().toISOString()));
    await navigate(patterns.shed, { replace: true });
  });

  return (
    <Page
      title="Add a bike"
      back={{ to: patterns.shed, label: "Shed" }}
      action={
        <Button type="submit" form="new-bike" look="primary" wide disabled={busy}>
          Save the bike
        </Button>
      }
    >
      <Form id="new-bike" onSubmit={submit} problem={problem}>
        <TextField
          label="Name"
          hint="What you call it."
          autoComplete="off"
          value={form.name}
          onChange={(event) => set({ name: event.target.value })}
          error={errors["body.name"]}
        />
        <Fold title="Make, model and year">
          <div className="flex flex-col gap-5">
            <MakeFields form={form} set={set} errors={errors} />
          </div>
        </Fold>
        <MeterFields
          form={form}
          set={(change) => set(change.meterFormat ? { ...change, hours: "" } : change)}
        />
        <HoursField
          label="Hours now"
          hint="May be left empty."
          error={errors.hours}
          value={form.hours}
          onChange={(hours) => set({ hours })}
          meterFormat={form.meterFormat}
        />
        <IntervalFields form={form} set={set} errors={errors} />
        <SequenceFields form={form} set={set} errors={errors} />
      </Form>
    </Page>
  );
}
