import { numberStepMl } from "../../../ui/column-scale.ts";
import { Field, numberClass, type FieldWiring, type FieldWords } from "../../../ui/field.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import type { Syringe } from "../../../../shared/schemas/entry.ts";
import { stepLevel } from "../draft/step-level.ts";
import { SyringeDrawing } from "../syringe-drawing.tsx";

interface Props extends FieldWords {
  syringe: Pick<Syringe, "capacityMl" | "graduationMl">;
  startMl: number | null;
  value: string;
  onChange: (text: string) => void;
}

/** Between two marks, half of their step is what an eye can still tell. */
const halfMark = ({ graduationMl }: Props["syringe"]) => graduationMl / 2;
const asText = (ml: number) => String(Number(ml.toFixed(3)));

/** The level in the rider's own syringe: set beside it by large steps, by a tap on it, or typed. */
export function LevelField({ syringe, startMl, value, onChange, ...words }: Props) {
  const levelMl = parseDecimal(value);
  const pick = (ml: number) => {
    const step = halfMark(syringe);
    onChange(asText(Math.round(ml / step) * step));
  };
  return (
    <Field {...words}>
      {(wiring) => (
        <div className="flex flex-wrap items-stretch gap-3">
          <SyringeDrawing
            eye
            syringe={syringe}
            levelMl={levelMl}
            startMl={startMl}
            onPick={pick}
            className="h-[max(20rem,min(24rem,52dvh))] min-w-32 flex-1"
          />
          <UprightStepper
            syringe={syringe}
            fromMl={levelMl ?? startMl ?? 0}
            wiring={wiring}
            value={value}
            onChange={onChange}
          />
        </div>
      )}
    </Field>
  );
}

interface StepperProps extends Pick<Props, "syringe" | "value" | "onChange"> {
  fromMl: number;
  wiring: FieldWiring;
}

function UprightStepper({ syringe, fromMl, wiring, value, onChange }: StepperProps) {
  const small = halfMark(syringe);
  const large = numberStepMl({ maxMl: syringe.capacityMl, graduationMl: syringe.graduationMl });
  const step = (by: number, direction: 1 | -1) => {
    const next = by === small ? stepLevel(fromMl, by, direction) : fromMl + direction * by;
    onChange(asText(Math.max(0, next)));
  };
  return (
    <div className="flex min-w-32 flex-[0_1_8.5rem] flex-col gap-2">
      <StepButton by={large} direction={1} onStep={step} />
      <StepButton by={small} direction={1} onStep={step} />
      <div className="relative flex-1">
        <input
          {...wiring}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          enterKeyHint="done"
          value={value}
          onChange={(event) => onChange(event.target.value)}
          onFocus={(event) => event.target.select()}
          className={`${numberClass()} h-full min-h-20 pb-5 text-5xl!`}
        />
        <span className="pointer-events-none absolute inset-x-0 bottom-1 text-center text-soft">
          mL
        </span>
      </div>
      <StepButton by={small} direction={-1} onStep={step} />
      <StepButton by={large} direction={-1} onStep={step} />
    </div>
  );
}

interface StepButtonProps {
  by: number;
  direction: 1 | -1;
  onStep: (by: number, direction: 1 | -1) => void;
}

function StepButton({ by, direction, onStep }: StepButtonProps) {
  const sign = direction > 0 ? "+" : "−";
  return (
    <button
      type="button"
      aria-label={`Level ${direction > 0 ? "up" : "down"} ${asText(by)} mL`}
      onClick={() => onStep(by, direction)}
      className="min-h-16 rounded-card border border-edge bg-card text-2xl font-bold tabular-nums active:bg-rule"
    >
      {sign}
      {asText(by)}
    </button>
  );
}
