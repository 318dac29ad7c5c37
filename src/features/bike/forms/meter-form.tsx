import { useState } from "react";
import { formatHours } from "../../../ui/format-hours.ts";
import { HoursField } from "../../../ui/hours-field.tsx";
import { EntryForm } from "./entry-form.tsx";
import type { EntryFormProps } from "./entry-form-props.ts";
import { typedHours } from "./typed-values.ts";

export function MeterForm({ record, mends }: EntryFormProps<"meter">) {
  const { meterFormat } = record.details;
  const [newReading, setNewReading] = useState(
    formatHours(mends?.body.newReading ?? 0, meterFormat),
  );
  return (
    <EntryForm
      title="Change the meter"
      record={record}
      mends={mends}
      hoursLabel="The old meter's last reading"
      hoursHint="Clear it if the old meter could not be read: then the last logged hours are taken."
      hoursFirst
      makeEntry={(common) => ({
        ...common,
        kind: "meter",
        body: { newReading: typedHours(newReading) ?? NaN },
      })}
    >
      {(errors) => (
        <HoursField
          label="The new meter shows"
          hint="The hours of the bike's life go on counting from the old one."
          error={errors["body.newReading"]}
          value={newReading}
          onChange={setNewReading}
          meterFormat={meterFormat}
          large
        />
      )}
    </EntryForm>
  );
}
