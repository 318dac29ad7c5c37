import type { ComponentProps } from "react";

/** A workshop card: paper with a hairline round it. */
export function Card({ className = "", ...rest }: ComponentProps<"section">) {
  return (
    <section {...rest} className={`rounded-card border border-rule bg-card p-4 ${className}`} />
  );
}
