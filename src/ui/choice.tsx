import { useId, type ReactNode } from "react";
import { FieldNotes, type FieldWords } from "./field.tsx";

interface Option<V extends string> {
  value: V;
  label: ReactNode;
  /** A second, quieter line. */
  hint?: ReactNode;
}

interface Props<V extends string> extends FieldWords {
  options: readonly Option<V>[];
  value: V | null;
  onChange: (value: V) => void;
  /** One option under the other, for longer words. */
  stacked?: boolean;
}

/** One of a few, all in sight: radio buttons drawn as large segments, the chosen one also ticked. */
export function Choice<V extends string>(props: Props<V>) {
  const { label, hint, error, options, value, onChange, stacked = false } = props;
  const id = useId();
  return (
    <fieldset
      aria-describedby={`${id}-hint ${id}-error`}
      className="flex min-w-0 flex-col gap-1"
      role="radiogroup"
    >
      <legend className="mb-1 font-bold">{label}</legend>
      <div className={stacked ? "flex flex-col gap-2" : "flex flex-wrap gap-2"}>
        {options.map((option) => (
          <label
            key={option.value}
            className="flex min-h-target flex-1 items-center gap-3 rounded-card border border-edge bg-card px-3 py-2 has-checked:border-ink has-checked:bg-ink has-checked:text-paper"
          >
            <input
              type="radio"
              name={id}
              value={option.value}
              checked={option.value === value}
              onChange={() => onChange(option.value)}
              className="size-5 shrink-0 accent-(--oil)"
            />
            <span className="flex flex-col leading-tight">
              <span className="font-bold">{option.label}</span>
              {option.hint && <span>{option.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      <FieldNotes id={id} hint={hint} error={error} />
    </fieldset>
  );
}
