import { controlClass, Field, type FieldWords } from "./field.tsx";
import { fromLocalDateTime, toLocalDateTime } from "./local-date-time.ts";

interface Props extends FieldWords {
  /** ISO instant; a form starts it at now. */
  value: string;
  onChange: (instant: string) => void;
}

/**
 * When it happened, in the rider's own time. A half-typed date changes nothing and is put back on
 * leaving, so that there is always a moment to save.
 */
export function DateTimeField({ value, onChange, ...words }: Props) {
  return (
    <Field {...words}>
      {(wiring) => (
        <input
          {...wiring}
          type="datetime-local"
          defaultValue={toLocalDateTime(value)}
          onChange={(event) => {
            const instant = fromLocalDateTime(event.target.value);
            if (instant) onChange(instant);
          }}
          onBlur={(event) => {
            event.target.value = toLocalDateTime(value);
          }}
          className={controlClass}
        />
      )}
    </Field>
  );
}
