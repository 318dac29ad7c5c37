import type { ReactNode } from "react";
import { numberClass, type FieldWiring } from "./field.tsx";
import { MinusIcon, PlusIcon } from "./icons.tsx";

interface Props {
  /** What the buttons name: `Fuel: more`. */
  label: string;
  wiring: Partial<FieldWiring>;
  value: string;
  onChange: (text: string) => void;
  onStep: (direction: 1 | -1) => void;
  inputMode: "text" | "decimal" | "numeric";
  unit?: string;
  /** Figures at arm's length, for the one number a screen is about. */
  large?: boolean;
}

/** A number between a minus and a plus. Text, so that `3,8` is kept as it was typed. */
export function StepperInput(props: Props) {
  const { label, wiring, value, onChange, onStep, inputMode, unit, large } = props;
  return (
    <div className="flex items-stretch gap-2">
      <StepButton name={`${label}: less`} onClick={() => onStep(-1)}>
        <MinusIcon />
      </StepButton>
      <div className="relative min-w-0 flex-1">
        <input
          {...wiring}
          type="text"
          inputMode={inputMode}
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
      <StepButton name={`${label}: more`} onClick={() => onStep(1)}>
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
