import { USUAL_ACT_DROP, USUAL_WATCH_DROP } from "../../../../shared/schemas/entry.ts";
import { NumberField } from "../../../ui/number-field.tsx";
import type { DetailsForm } from "./details-patch.ts";

interface Props {
  form: DetailsForm;
  set: (change: Partial<DetailsForm>) => void;
  errors: Record<string, string>;
}

/** Limits may be tightened, never loosened. */
export function LimitFields({ form, set, errors }: Props) {
  return (
    <>
      <p>
        The limits below are common practice, not a standard. They can be made tighter for this
        bike, not looser.
      </p>
      <NumberField
        label="Delivery is dropping from"
        hint={`Under the baseline; ${100 * USUAL_WATCH_DROP}\u00a0% at most.`}
        error={errors["body.watchDrop"]}
        value={form.watchPercent}
        onChange={(watchPercent) => set({ watchPercent })}
        step={1}
        min={1}
        max={100 * USUAL_WATCH_DROP}
        unit="%"
      />
      <NumberField
        label="Delivery is low from"
        hint={`Under the baseline; ${100 * USUAL_ACT_DROP}\u00a0% at most.`}
        error={errors["body.actDrop"]}
        value={form.actPercent}
        onChange={(actPercent) => set({ actPercent })}
        step={1}
        min={1}
        max={100 * USUAL_ACT_DROP}
        unit="%"
      />
    </>
  );
}
