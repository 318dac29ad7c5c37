import type { Syringe } from "../../../offline/index.ts";
import { SelectField } from "../../../ui/select-field.tsx";
import { AddSyringe } from "../add-syringe.tsx";
import { syringeOptions } from "../syringe-options.ts";

const UNKNOWN = "unknown";

interface Props {
  syringes: Syringe[];
  value: Syringe | null;
  onChange: (syringe: Syringe | null) => void;
}

/** Which syringe; an old note may not say. */
export function QuickSyringe({ syringes, value, onChange }: Props) {
  const options = syringeOptions(syringes, value);
  return (
    <div className="flex flex-col gap-2">
      <SelectField
        label="Syringe"
        options={[
          ...options.map(({ id, label, graduationMl }) => ({
            value: id,
            label: `${label}, ${graduationMl} mL marks`,
          })),
          { value: UNKNOWN, label: "Not known" },
        ]}
        value={value?.id ?? UNKNOWN}
        onChange={(id) => onChange(options.find((one) => one.id === id) ?? null)}
      />
      <AddSyringe onAdded={onChange} />
    </div>
  );
}
