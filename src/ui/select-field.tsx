import { controlClass, Field, type FieldWords } from "./field.tsx";

interface Props<V extends string> extends FieldWords {
  options: readonly { value: V; label: string }[];
  value: V;
  onChange: (value: V) => void;
}

/** One of many, by the browser's own list. */
export function SelectField<V extends string>({ options, value, onChange, ...words }: Props<V>) {
  return (
    <Field {...words}>
      {(wiring) => (
        <select
          {...wiring}
          value={value}
          onChange={(event) => onChange(event.target.value as V)}
          className={controlClass}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
