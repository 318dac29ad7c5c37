import type { ReactNode } from "react";
import { DownIcon } from "./icons.tsx";

/** What is seldom needed, one tap away. */
export function Fold({ title, children }: { title: ReactNode; children: ReactNode }) {
  return (
    <details className="group">
      <summary className="flex min-h-target items-center gap-1 font-bold text-oil">
        {title}
        <DownIcon className="shrink-0 group-open:rotate-180" />
      </summary>
      <div className="pt-1">{children}</div>
    </details>
  );
}
