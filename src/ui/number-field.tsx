import { Field, type FieldWords } from "./field.tsx";
import { parseDecimal } from "./parse-decimal.ts";
import { stepDecimal, type StepLimits } from "./step-decimal.ts";
import { StepperInput } from "./stepper-input.tsx";

export interface NumberInput extends StepLimits {
  /** What stands in the field, as typed; `parseDecimal` reads it. */
  value: string;
  onChange: (text: string) => void;
  /** What one press of − or + changes. */
  step: number;
  /** What the first press shows where nothing stands yet; otherwise a step from 0. */
  startAt?: number;
  unit?: string;
  /** Figures at arm's length, for the one number a screen is about. */
  large?: boolean;
}

type Props = FieldWords & NumberInput;

/** A number with a stepper, and a decimal keyboard. */
export function NumberField({ label, hint, error, step, min, max, startAt, ...input }: Props) {
  const { value, onChange } = input;
  const press = (direction: 1 | -1) =>
    startAt !== undefined && parseDecimal(value) === null
      ? onChange(String(startAt))
      : onChange(stepDecimal(value, direction * step, { min, max }));
  return (
    <Field label={label} hint={hint} error={error}>
      {(wiring) => (
        <StepperInput
          {...input}
          label={label}
          wiring={wiring}
          inputMode={min !== undefined && min >= 0 ? "decimal" : "text"}
          onStep={press}
        />
      )}
    </Field>
  );
}
