import type { ReactNode } from "react";
import { Notice } from "./notice.tsx";

interface Props {
  id?: string;
  onSubmit: () => Promise<void>;
  problem: string | null;
  children: ReactNode;
}

/** Goes to the first field that is wrong, out of a fold if need be. */
function goToFirstError(form: HTMLFormElement): void {
  const field = form.querySelector<HTMLElement>("[aria-invalid]");
  field?.closest("details")?.setAttribute("open", "");
  field?.focus();
}

/** Fields one under the other, and what went wrong beside none of them. */
export function Form({ id, onSubmit, problem, children }: Props) {
  return (
    <form
      id={id}
      noValidate
      className="flex flex-col gap-5"
      onSubmit={(event) => {
        event.preventDefault();
        const form = event.currentTarget;
        void onSubmit().then(() => goToFirstError(form));
      }}
    >
      {children}
      {problem && <Notice tone="error" title={problem} />}
    </form>
  );
}
