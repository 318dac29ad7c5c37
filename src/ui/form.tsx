import type { ReactNode } from "react";
import { Notice } from "./notice.tsx";

interface Props {
  id?: string;
  onSubmit: () => Promise<void>;
  problem: string | null;
  children: ReactNode;
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
        void onSubmit();
      }}
    >
      {children}
      {problem && <Notice tone="error" title={problem} />}
    </form>
  );
}
