import type { ReactNode } from "react";

interface Props {
  name: string;
  /** There is nothing further that way. It keeps the focus, which a disabled button would lose. */
  spent: boolean;
  onStep: () => void;
  children: ReactNode;
}

export function StepButton({ name, spent, onStep, children }: Props) {
  return (
    <button
      type="button"
      aria-label={name}
      aria-disabled={spent}
      onClick={() => !spent && onStep()}
      className="flex min-h-target min-w-target shrink-0 items-center justify-center rounded-card border border-edge bg-card active:bg-rule aria-disabled:opacity-50"
    >
      {children}
    </button>
  );
}
