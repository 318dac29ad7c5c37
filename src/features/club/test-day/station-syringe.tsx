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
  const kept = value && !syringes.some(({ id }) => id === value.id) ? [value] : [];
  const options = [...kept, ...syringes];
  return (
    <section aria-labelledby="station" className="flex flex-col gap-3">
      <h2 id="station" className="text-2xl">
        This station
      </h2>
      <SelectField
        label="Syringe"
        hint="Every bike of the day is measured with it."
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
      <Button className="self-start" onClick={() => setAdding(true)}>
        <PlusIcon />
        Add a syringe
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
    </section>
  );
}
