import { useId } from "react";
import type { MeterFormat } from "../../shared/schemas/entry.ts";
import { FieldNotes, type FieldWords } from "./field.tsx";
import { formatHours } from "./format-hours.ts";
import { NumberField } from "./number-field.tsx";
import { parseDecimal } from "./parse-decimal.ts";
import { StepperInput } from "./stepper-input.tsx";

interface Props extends FieldWords {
  /** As typed: `12.5`, or `12:30` on an hh:mm meter; `parseHours` reads both. */
  value: string;
  onChange: (text: string) => void;
  meterFormat: MeterFormat;
  large?: boolean;
}

/** Engine hours, entered the way the bike's meter shows them. */
export function HoursField({ meterFormat, ...props }: Props) {
  if (meterFormat === "hh:mm") return <HoursAndMinutes {...props} />;
  return <NumberField {...props} step={0.1} min={0} unit="h" />;
}

function HoursAndMinutes(props: Omit<Props, "meterFormat">) {
  const id = useId();
  const { label, hint, error, value, onChange, large } = props;
  const [hours = "", minutes = ""] = value.split(":");
  // A minute more than 12:59 is 13:00.
  const step = (byMinutes: number) => {
    const now = 60 * (parseDecimal(hours) ?? 0) + (parseDecimal(minutes) ?? 0);
    onChange(formatHours(Math.max(0, now + byMinutes) / 60, "hh:mm"));
  };
  return (
    <fieldset aria-describedby={`${id}-hint ${id}-error`} className="flex min-w-0 flex-col gap-1">
      <legend className="mb-1 font-bold">{label}</legend>
      <div className="flex flex-wrap gap-x-4 gap-y-2">
        <Part
          {...{ name: "Hours", error, large, value: hours }}
          onChange={(text) => onChange(`${text}:${minutes}`)}
          onStep={(direction) => step(60 * direction)}
        />
        <Part
          {...{ name: "Minutes", error, large, value: minutes }}
          onChange={(text) => onChange(`${hours}:${text}`)}
          onStep={step}
        />
      </div>
      <FieldNotes id={id} hint={hint} error={error} />
    </fieldset>
  );
}

interface PartProps {
  name: string;
  value: string;
  onChange: (text: string) => void;
  onStep: (direction: 1 | -1) => void;
  error?: string;
  large?: boolean;
}

/** Beside each other where there is room for both steppers. */
function Part({ name, error, ...input }: PartProps) {
  const id = useId();
  return (
    <div className="flex min-w-0 flex-[1_1_13rem] flex-col gap-1">
      <label htmlFor={id} className="text-soft">
        {name}
      </label>
      <StepperInput
        {...input}
        label={name}
        wiring={{ id, "aria-invalid": error ? true : undefined }}
        inputMode="numeric"
      />
    </div>
  );
}
