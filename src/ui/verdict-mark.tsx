import type { Verdict } from "../../shared/schemas/entry.ts";
import { verdictWords } from "./words.ts";

/** Each verdict as a level in a vessel: level, stepping down, at the bottom and crossed, dashed. */
const shapes: Record<Verdict, string> = {
  none: "M7 12h10",
  settling: "M4 12h4m2 0h4m2 0h4",
  holding: "M4 12h16",
  dropping: "M4 8h7v8h9",
  low: "M4 20h16M8 6l8 8m0-8l-8 8",
};

const inks: Record<Verdict, string> = {
  none: "text-soft",
  settling: "text-settling",
  holding: "text-holding",
  dropping: "text-dropping",
  low: "text-low",
};

export function VerdictShape({ verdict, size = 24 }: { verdict: Verdict; size?: number }) {
  return (
    <svg
      viewBox="0 0 24 24"
      width={size}
      height={size}
      aria-hidden
      className={`shrink-0 ${inks[verdict]}`}
    >
      <path
        d={shapes[verdict]}
        fill="none"
        stroke="currentColor"
        strokeWidth={verdict === "none" ? 1.5 : 4}
        strokeLinejoin="miter"
      />
    </svg>
  );
}

/** A verdict in word, shape and colour. */
export function VerdictMark({ verdict }: { verdict: Verdict }) {
  return (
    <span className={`inline-flex items-center gap-2 font-bold ${inks[verdict]}`}>
      <VerdictShape verdict={verdict} />
      {verdictWords[verdict]}
    </span>
  );
}
