import { useId } from "react";
import { FieldNotes, type FieldWords } from "./field.tsx";
import { Tick } from "./tick.tsx";

interface Props<V extends string> extends FieldWords {
  options: readonly { value: V; label: string }[];
  chosen: readonly V[];
  onChange: (chosen: V[]) => void;
}

/** Any number of a few, kept in the order they are offered in. */
export function TickGroup<V extends string>(props: Props<V>) {
  const { label, hint, error, options, chosen, onChange } = props;
  const id = useId();
  const toggle = (value: V, on: boolean) =>
    onChange(
      options
        .map((option) => option.value)
        .filter((one) => (one === value ? on : chosen.includes(one))),
    );
  return (
    <fieldset aria-describedby={`${id}-hint ${id}-error`} className="flex min-w-0 flex-col">
      <legend className="font-bold">{label}</legend>
      {options.map(({ value, label }) => (
        <Tick
          key={value}
          checked={chosen.includes(value)}
          onChange={(checked) => toggle(value, checked)}
        >
          {label}
        </Tick>
      ))}
      <FieldNotes id={id} hint={hint} error={error} />
    </fieldset>
  );
}
