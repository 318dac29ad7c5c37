import type { ReactNode } from "react";

interface Props {
  checked: boolean;
  onChange: (checked: boolean) => void;
  children: ReactNode;
}

/** A box to tick, with the whole line as its target. */
export function Tick({ checked, onChange, children }: Props) {
  return (
    <label className="flex min-h-target items-center gap-3 py-1">
      <input
        type="checkbox"
        checked={checked}
        onChange={(event) => onChange(event.target.checked)}
        className="size-7 shrink-0 accent-(--oil)"
      />
      <span>{children}</span>
    </label>
  );
}
