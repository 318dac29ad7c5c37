import { useState, type ReactNode } from "react";
import { useNavigate } from "react-router-dom";
import { saveEntry, useHoldUpdates, type BikeWithLog } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Form } from "../../../ui/form.tsx";
import { IntervalFields } from "../../../ui/interval-fields.tsx";
import { MakeFields } from "../../../ui/make-fields.tsx";
import { MeterFields } from "../../../ui/meter-fields.tsx";
import { Page } from "../../../ui/page.tsx";
import { bikePath } from "../../../ui/paths.ts";
import { SequenceFields } from "../../../ui/sequence-fields.tsx";
import { TextField } from "../../../ui/text-field.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { NoPageHere } from "../no-page-here.tsx";
import { DeleteBike } from "./delete-bike.tsx";
import { detailsFormOf, detailsPatch, type DetailsForm } from "./details-patch.ts";
import { LimitFields } from "./limit-fields.tsx";
import { RetireBike } from "./retire-bike.tsx";
import { SequenceChangeNote } from "./sequence-change-note.tsx";

/** What the bike is and how it is judged; for its owner alone. */
export function BikeDetailsPage({ bike }: { bike: BikeWithLog }) {
  if (bike.record.access !== "owner") return <NoPageHere record={bike.record} />;
  return <OwnersDetailsPage bike={bike} />;
}

function OwnersDetailsPage({ bike }: { bike: BikeWithLog }) {
  useHoldUpdates();
  const { bikeId, details } = bike.record;
  const navigate = useNavigate();
  const [form, setForm] = useState(() => detailsFormOf(details));
  const set = (change: Partial<DetailsForm>) => setForm((before) => ({ ...before, ...change }));
  const { submit, busy, errors, problem } = useSubmit(async () => {
    const body = detailsPatch(details, form);
    const at = new Date().toISOString();
    const changed = Object.keys(body).length > 0;
    if (changed) await saveEntry({ bikeId, kind: "bike", at, hours: null, body });
    await navigate(bikePath(bikeId), { replace: true, state: { saved: changed } });
  });
  const part = { form, set, errors };

  return (
    <Page
      title="Details and settings"
      back={{ to: bikePath(bikeId), label: details.name }}
      action={
        <Button type="submit" form="details" look="primary" wide disabled={busy}>
          Save
        </Button>
      }
    >
      <Form id="details" onSubmit={submit} problem={problem}>
        <Part title="The bike">
          <TextField
            label="Name"
            autoComplete="off"
            value={form.name}
            onChange={(event) => set({ name: event.target.value })}
            error={errors["body.name"]}
          />
          <MakeFields {...part} />
        </Part>
        <Part title="Its meter">
          <MeterFields {...part} />
        </Part>
        <Part title="Its checks">
          <IntervalFields {...part} />
          <SequenceFields {...part} />
          <SequenceChangeNote details={details} form={form} />
          <LimitFields {...part} />
        </Part>
      </Form>
      <Part title="Put it away">
        <RetireBike record={bike.record} />
        <DeleteBike bike={bike} />
      </Part>
    </Page>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-5 border-t border-rule pt-4">
      <h2 className="text-2xl">{title}</h2>
      {children}
    </section>
  );
}
