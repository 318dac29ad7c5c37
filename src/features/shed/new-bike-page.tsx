import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { v7 as uuidv7 } from "uuid";
import { saveEntry, useHoldUpdates } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Choice } from "../../ui/choice.tsx";
import { Fold } from "../../ui/fold.tsx";
import { Form } from "../../ui/form.tsx";
import { HoursField } from "../../ui/hours-field.tsx";
import { NumberField } from "../../ui/number-field.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { TextField } from "../../ui/text-field.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { emptyForm, newBikeEntry, usualIntervalHours, type NewBikeForm } from "./new-bike-entry.ts";
import { SequenceFields } from "./sequence-fields.tsx";

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
  const text = (field: "name" | "make" | "model" | "year") => ({
    value: form[field],
    onChange: (event: { target: { value: string } }) => set({ [field]: event.target.value }),
    error: errors[`body.${field}`],
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
        <TextField label="Name" hint="What you call it." autoComplete="off" {...text("name")} />
        <Fold title="Make, model and year">
          <div className="flex flex-col gap-5">
            <TextField label="Make" autoComplete="off" {...text("make")} />
            <TextField label="Model" autoComplete="off" {...text("model")} />
            <TextField label="Year" inputMode="numeric" autoComplete="off" {...text("year")} />
          </div>
        </Fold>
        <MeterFields form={form} set={set} errors={errors} />
        <Choice
          label="Screen ahead of the oil pump"
          options={[
            { value: "yes", label: "Yes" },
            { value: "no", label: "No" },
            { value: "unknown", label: "Not known" },
          ]}
          value={form.screen}
          onChange={(screen) => set({ screen })}
        />
        <NumberField
          label="Hours between checks"
          hint="Usual: 40 with a screen, 20 without."
          error={errors["body.intervalHours"]}
          value={form.interval || String(usualIntervalHours(form.screen))}
          onChange={(interval) => set({ interval })}
          step={5}
          min={1}
          unit="h"
        />
        <SequenceFields form={form} set={set} errors={errors} />
      </Form>
    </Page>
  );
}

export interface Part {
  form: NewBikeForm;
  set: (change: Partial<NewBikeForm>) => void;
  errors: Record<string, string>;
}

function MeterFields({ form, set, errors }: Part) {
  return (
    <>
      <Choice
        label="Hour meter"
        stacked
        options={[
          { value: "engine", label: "Engine hours", hint: "It counts while the engine runs." },
          { value: "ignition", label: "Ignition hours", hint: "It counts while the key is on." },
          { value: "estimated", label: "No meter", hint: "You estimate the hours you ride." },
        ]}
        value={form.meter}
        onChange={(meter) => set({ meter })}
      />
      {form.meter !== "estimated" && (
        <Choice
          label="The meter shows"
          options={[
            { value: "decimal", label: "12.5" },
            { value: "hh:mm", label: "12:30" },
          ]}
          value={form.meterFormat}
          onChange={(meterFormat) => set({ meterFormat, hours: "" })}
        />
      )}
      <HoursField
        label="Hours now"
        hint="May be left empty."
        error={errors.hours}
        value={form.hours}
        onChange={(hours) => set({ hours })}
        meterFormat={form.meterFormat}
      />
    </>
  );
}
