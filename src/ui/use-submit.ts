import { useState } from "react";
import { flushSync } from "react-dom";

interface Outcome {
  busy: boolean;
  /** A sentence for each wrong field. */
  errors: Record<string, string>;
  /** What went wrong that is no field's fault. */
  problem: string | null;
}

/** As the store and the server's client throw them: `code` marks an error with words for a rider. */
interface TypedError {
  code?: string;
  message: string;
  errors?: Record<string, string>;
  problem?: { errors?: Record<string, string> };
}

const calm: Outcome = { busy: false, errors: {}, problem: null };

function outcomeOf(error: TypedError): Outcome {
  const errors = error.errors ?? error.problem?.errors ?? {};
  if (Object.keys(errors).length > 0) return { ...calm, errors };
  if (error.code) return { ...calm, problem: error.message };
  console.error(error);
  return {
    ...calm,
    problem: "Something in the app went wrong. What you typed is still here: please try again.",
  };
}

/**
 * What a form does when it is sent: `work` runs once at a time, and whatever it throws becomes the
 * sentences to show. A field's error may also be thrown as `new FieldErrors({ … })`.
 */
export function useSubmit(work: () => Promise<void>) {
  const [outcome, setOutcome] = useState(calm);
  const submit = async () => {
    if (outcome.busy) return;
    setOutcome({ ...calm, busy: true });
    const next = await work().then(
      () => calm,
      (error: unknown) => outcomeOf(error as TypedError),
    );
    // At once, so that whoever waits for the end finds the sentences on the screen.
    flushSync(() => setOutcome(next));
  };
  return { ...outcome, submit };
}

/** What a form finds wrong before anything is sent or saved, by field. */
export class FieldErrors extends Error {
  override name = "FieldErrors";
  readonly code = "field-errors";
  readonly errors: Record<string, string>;
  constructor(errors: Record<string, string>) {
    super("Something here does not fit.");
    this.errors = errors;
  }
}
