import { useId, type ReactNode } from "react";

export interface FieldWords {
  label: string;
  /** What to type, where the label does not say it. */
  hint?: ReactNode;
  /** What is wrong with what was typed. */
  error?: string;
}

/** What the control inside a field must carry to be tied to its label, hint and error. */
export interface FieldWiring {
  id: string;
  "aria-describedby": string | undefined;
  "aria-invalid": true | undefined;
}

type Props = FieldWords & { children: (wiring: FieldWiring) => ReactNode };

export function Field({ label, hint, error, children }: Props) {
  const id = useId();
  const described = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(" ");
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="font-bold">
        {label}
      </label>
      {children({
        id,
        "aria-describedby": described || undefined,
        "aria-invalid": error ? true : undefined,
      })}
      <FieldNotes id={id} hint={hint} error={error} />
    </div>
  );
}

/** The lines under a field: its hint, and its error in word, mark and colour. */
export function FieldNotes({ id, hint, error }: { id: string } & Omit<FieldWords, "label">) {
  return (
    <>
      {hint && (
        <p id={`${id}-hint`} className="text-soft">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="border-l-4 border-low pl-2 font-bold text-low">
          {error}
        </p>
      )}
    </>
  );
}

/** The look that every typed-in control shares, but for the size of its letters. */
export const boxClass =
  "min-h-target w-full min-w-0 rounded-card border border-edge bg-card text-ink aria-invalid:border-2 aria-invalid:border-low";
export const controlClass = `${boxClass} px-3 text-xl`;
/** A box for a number; `large` where it is the one figure of a screen, which a long one must fit. */
export function numberClass(large = false, text = ""): string {
  const figure = text.length > 5 ? "text-figure-long" : "text-figure";
  return `${boxClass} px-1 text-center font-bold tabular-nums ${large ? `py-2 ${figure}` : "text-2xl"}`;
}
