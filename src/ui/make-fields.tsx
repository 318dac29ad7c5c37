import type { BikeFormPart } from "./bike-form.ts";
import { NumberField } from "./number-field.tsx";
import { TextField } from "./text-field.tsx";

export function MakeFields({ form, set, errors }: BikeFormPart) {
  const text = (field: "make" | "model") => ({
    autoComplete: "off",
    value: form[field],
    onChange: (event: { target: { value: string } }) => set({ [field]: event.target.value }),
    error: errors[`body.${field}`],
  });
  return (
    <>
      <TextField label="Make" {...text("make")} />
      <TextField label="Model" {...text("model")} />
      <NumberField
        label="Year"
        value={form.year}
        onChange={(year) => set({ year })}
        error={errors["body.year"]}
        step={1}
        min={1900}
        startAt={new Date().getFullYear()}
      />
    </>
  );
}
