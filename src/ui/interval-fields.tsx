import { checkIntervalHours } from "../../shared/delivery/next-due.ts";
import type { BikeFormPart } from "./bike-form.ts";
import { Choice } from "./choice.tsx";
import { NumberField } from "./number-field.tsx";

/** How often the delivery is to be checked: what keeps grit from the pump decides what is usual. */
export function IntervalFields({ form, set, errors }: BikeFormPart) {
  const hasScreen = form.screen === "yes";
  return (
    <>
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
        value={form.interval || String(checkIntervalHours({ intervalHours: null, hasScreen }))}
        onChange={(interval) => set({ interval })}
        step={5}
        min={1}
        unit="h"
      />
    </>
  );
}
