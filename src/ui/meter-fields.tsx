import type { BikeFormPart } from "./bike-form.ts";
import { Choice } from "./choice.tsx";

/** What counts the engine's hours, and how it shows them. */
export function MeterFields({ form, set }: Omit<BikeFormPart, "errors">) {
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
          onChange={(meterFormat) => set({ meterFormat })}
        />
      )}
    </>
  );
}
