import { useState } from "react";
import { v7 as makeId } from "uuid";
import { syringeSchema, type Syringe } from "../../shared/schemas/entry.ts";
import { errorsByField } from "../../shared/schemas/errors-by-field.ts";
import { Button } from "./button.tsx";
import { Choice } from "./choice.tsx";
import { usualScales } from "./column-scale.ts";
import { Form } from "./form.tsx";
import { NumberField } from "./number-field.tsx";
import { parseDecimal } from "./parse-decimal.ts";
import { TextField } from "./text-field.tsx";
import { FieldErrors, useSubmit } from "./use-submit.ts";

interface Props {
  /** The syringe to change; without it a new one is made. */
  syringe?: Syringe;
  onSave: (syringe: Syringe) => Promise<void>;
}

const asKey = (maxMl: number, graduationMl: number) => `${maxMl}/${graduationMl}`;
const usualKeys = usualScales.map(({ maxMl, graduationMl }) => asKey(maxMl, graduationMl));
const OTHER = "other";

/** A barrel as it is commonly sold, or any other by its two numbers. */
export function SyringeForm({ syringe, onSave }: Props) {
  const [label, setLabel] = useState(syringe?.label ?? "");
  const [capacity, setCapacity] = useState(syringe ? String(syringe.capacityMl) : "5");
  const [graduation, setGraduation] = useState(syringe ? String(syringe.graduationMl) : "0.2");
  const [other, setOther] = useState(!usualKeys.includes(`${capacity}/${graduation}`));

  const pick = (key: string) => {
    setOther(key === OTHER);
    const [capacityMl, graduationMl] = key.split("/");
    if (key === OTHER || !capacityMl || !graduationMl) return;
    setCapacity(capacityMl);
    setGraduation(graduationMl);
  };
  const { submit, busy, errors, problem } = useSubmit(async () => {
    const parsed = syringeSchema.safeParse({
      id: syringe?.id ?? makeId(),
      label: label.trim() || `${capacity.trim().replace(",", ".")} mL syringe`,
      capacityMl: parseDecimal(capacity),
      graduationMl: parseDecimal(graduation),
    });
    if (!parsed.success) throw new FieldErrors(errorsByField(parsed.error));
    await onSave(parsed.data);
  });

  return (
    <Form onSubmit={submit} problem={problem}>
      <Choice
        label="Barrel and marks"
        hint="The marks are the step between two lines next to each other."
        options={[
          ...usualScales.map(({ maxMl, graduationMl }) => ({
            value: asKey(maxMl, graduationMl),
            label: `${maxMl}\u00a0mL`,
            hint: `${graduationMl}\u00a0mL marks`,
          })),
          { value: OTHER, label: "Another" },
        ]}
        value={other ? OTHER : `${capacity}/${graduation}`}
        onChange={pick}
      />
      {other && (
        <>
          <NumberField
            label="Highest mark"
            error={errors.capacityMl}
            value={capacity}
            onChange={setCapacity}
            step={1}
            min={0}
            unit="mL"
          />
          <NumberField
            label="One graduation"
            error={errors.graduationMl}
            value={graduation}
            onChange={setGraduation}
            step={0.05}
            min={0}
            unit="mL"
          />
        </>
      )}
      <TextField
        label="Name"
        hint="May be left empty."
        autoComplete="off"
        error={errors.label}
        value={label}
        onChange={(event) => setLabel(event.target.value)}
      />
      <Button type="submit" look="primary" wide disabled={busy}>
        Save the syringe
      </Button>
    </Form>
  );
}
