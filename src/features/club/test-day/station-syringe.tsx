import { useState } from "react";
import { saveSyringe, useSyringes, type Syringe } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { PlusIcon } from "../../../ui/icons.tsx";
import { SelectField } from "../../../ui/select-field.tsx";
import { Sheet } from "../../../ui/sheet.tsx";
import { SyringeForm } from "../../../ui/syringe-form.tsx";

const NONE = "";

interface Props {
  value: Syringe | null;
  onChange: (syringe: Syringe) => void;
}

/** What every bike of the day is measured with: chosen once. */
export function StationSyringe({ value, onChange }: Props) {
  const { data: syringes = [] } = useSyringes();
  const [adding, setAdding] = useState(false);
  const retired = value && !syringes.some(({ id }) => id === value.id) ? [value] : [];
  const options = [...retired, ...syringes];
  return (
    <div className="flex items-end gap-2">
      <div className="min-w-0 flex-1">
        <SelectField
          label="This station’s syringe"
          options={[
            ...(value ? [] : [{ value: NONE, label: "Choose one" }]),
            ...options.map(({ id, label, graduationMl }) => ({
              value: id,
              label: `${label}, ${graduationMl} mL marks`,
            })),
          ]}
          value={value?.id ?? NONE}
          onChange={(id) => {
            const syringe = options.find((one) => one.id === id);
            if (syringe) onChange(syringe);
          }}
        />
      </div>
      <Button aria-label="Add a syringe" onClick={() => setAdding(true)}>
        <PlusIcon />
      </Button>
      {adding && (
        <Sheet title="Add a syringe" onClose={() => setAdding(false)}>
          <SyringeForm
            onSave={async (syringe) => {
              await saveSyringe(syringe);
              onChange(syringe);
              setAdding(false);
            }}
          />
        </Sheet>
      )}
    </div>
  );
}
