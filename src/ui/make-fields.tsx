import type { BikeFormPart } from "./bike-form.ts";
import { TextField } from "./text-field.tsx";

export function MakeFields({ form, set, errors }: BikeFormPart) {
  const text = (field: "make" | "model" | "year") => ({
    autoComplete: "off",
    value: form[field],
    onChange: (event: { target: { value: string } }) => set({ [field]: event.target.value }),
    error: errors[`body.${field}`],
  });
  return (
    <>
      <TextField label="Make" {...text("make")} />
      <TextField label="Model" {...text("model")} />
      <TextField label="Year" inputMode="numeric" {...text("year")} />
    </>
  );
}
