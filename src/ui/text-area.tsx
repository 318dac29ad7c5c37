import type { ComponentProps } from "react";
import { controlClass, Field, type FieldWords } from "./field.tsx";

type Props = Omit<ComponentProps<"textarea">, "id"> & FieldWords;

/** Several lines of text: notes and reasons. */
export function TextArea({ label, hint, error, ...area }: Props) {
  return (
    <Field label={label} hint={hint} error={error}>
      {(wiring) => <textarea rows={3} {...area} {...wiring} className={`${controlClass} py-2`} />}
    </Field>
  );
}
