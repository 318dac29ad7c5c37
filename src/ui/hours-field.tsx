import { useId } from "react";
import type { MeterFormat } from "../../shared/schemas/entry.ts";
import { numberClass, FieldNotes, type FieldWords } from "./field.tsx";
import { NumberField } from "./number-field.tsx";

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
  const [hours = "", minutes = ""] = props.value.split(":");
  return (
    <fieldset aria-describedby={`${id}-hint ${id}-error`} className="flex flex-col gap-1">
      <legend className="mb-1 font-bold">{props.label}</legend>
      <div className="flex items-center gap-2">
        <Part
          {...props}
          name="Hours"
          value={hours}
          set={(text) => props.onChange(`${text}:${minutes}`)}
        />
        <span aria-hidden className="text-3xl font-bold">
          :
        </span>
        <Part
          {...props}
          name="Minutes"
          value={minutes}
          set={(text) => props.onChange(`${hours}:${text}`)}
        />
      </div>
      <FieldNotes id={id} hint={props.hint} error={props.error} />
    </fieldset>
  );
}

interface PartProps {
  name: string;
  value: string;
  set: (text: string) => void;
  error?: string;
  large?: boolean;
}

function Part({ name, value, set, error, large }: PartProps) {
  return (
    <label className="flex min-w-0 flex-1 flex-col gap-1">
      <input
        type="text"
        inputMode="numeric"
        autoComplete="off"
        aria-invalid={error ? true : undefined}
        value={value}
        onChange={(event) => set(event.target.value)}
        onFocus={(event) => event.target.select()}
        className={numberClass(large, value)}
      />
      <span className="text-center text-soft">{name}</span>
    </label>
  );
}
