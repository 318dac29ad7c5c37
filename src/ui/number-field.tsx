import type { ReactNode } from "react";
import { MinusIcon, PlusIcon } from "./icons.tsx";
import { numberClass, Field, type FieldWiring, type FieldWords } from "./field.tsx";
import { stepDecimal, type StepLimits } from "./step-decimal.ts";

export interface NumberInput extends StepLimits {
  /** What stands in the field, as typed; `parseDecimal` reads it. */
  value: string;
  onChange: (text: string) => void;
  /** What one press of − or + changes. */
  step: number;
  unit?: string;
  /** Figures at arm's length, for the one number a screen is about. */
  large?: boolean;
}

type Props = FieldWords & NumberInput;

/** A number with a stepper. Text with a decimal keyboard, so that `3,8` is kept as it was typed. */
export function NumberField({ label, hint, error, ...input }: Props) {
  return (
    <Field label={label} hint={hint} error={error}>
      {(wiring) => <StepperInput label={label} wiring={wiring} {...input} />}
    </Field>
  );
}

function StepperInput(props: NumberInput & { label: string; wiring: FieldWiring }) {
  const { label, wiring, value, onChange, step, unit, large, min, max } = props;
  const press = (by: number) => onChange(stepDecimal(value, by, { min, max }));
  return (
    <div className="flex items-stretch gap-2">
      <StepButton name={`${label}: less`} onClick={() => press(-step)}>
        <MinusIcon />
      </StepButton>
      <div className="relative min-w-0 flex-1">
        <input
          {...wiring}
          type="text"
          inputMode={min !== undefined && min >= 0 ? "decimal" : "text"}
          autoComplete="off"
          enterKeyHint="done"
          value={value}
          onChange={(event) => onChange(event.target.value)}
          onFocus={(event) => event.target.select()}
          className={`${numberClass(large, value)} h-full`}
        />
        {unit && (
          <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-soft">
            {unit}
          </span>
        )}
      </div>
      <StepButton name={`${label}: more`} onClick={() => press(step)}>
        <PlusIcon />
      </StepButton>
    </div>
  );
}

function StepButton(props: { name: string; onClick: () => void; children: ReactNode }) {
  return (
    <button
      type="button"
      aria-label={props.name}
      onClick={props.onClick}
      className="flex min-h-target min-w-target shrink-0 items-center justify-center rounded-card border border-edge bg-card active:bg-rule"
    >
      {props.children}
    </button>
  );
}
