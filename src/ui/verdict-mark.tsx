import type { Verdict } from "../../shared/schemas/entry.ts";
import { verdictWords } from "./words.ts";

/** Each verdict as a level in a vessel: level, stepping down, at the bottom with a cross, dashed. */
const levels: Record<Verdict, string> = {
  none: "",
  settling: "M6 12h3m2 0h4m2 0h3",
  holding: "M6 12h14",
  dropping: "M6 9h7v7h7",
  low: "M6 20h14",
};

const inks: Record<Verdict, string> = {
  none: "text-soft",
  settling: "text-settling",
  holding: "text-holding",
  dropping: "text-dropping",
  low: "text-low",
};

export function VerdictShape({ verdict, size = 28 }: { verdict: Verdict; size?: number }) {
  return (
    <svg
      viewBox="0 0 26 26"
      width={size}
      height={size}
      fill="none"
      stroke="currentColor"
      aria-hidden
      className={`shrink-0 ${inks[verdict]}`}
    >
      <path d="M3 3v20h20V3" strokeWidth="1.5" strokeLinecap="round" strokeLinejoin="round" />
      <path d={levels[verdict]} strokeWidth="4" />
      {verdict === "low" && <path d="m8.5 5 9 9m0-9-9 9" strokeWidth="2.5" strokeLinecap="round" />}
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
