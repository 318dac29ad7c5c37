import type { ComponentProps } from "react";
import { controlClass, Field, type FieldWords } from "./field.tsx";

type Props = Omit<ComponentProps<"input">, "id"> & FieldWords;

/** One line of text; takes what an `<input>` takes, a form library's `ref` included. */
export function TextField({ label, hint, error, ...input }: Props) {
  return (
    <Field label={label} hint={hint} error={error}>
      {(wiring) => <input type="text" {...input} {...wiring} className={controlClass} />}
    </Field>
  );
}
