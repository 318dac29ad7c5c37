import type { CheckSummary } from "../../shared/schemas/summary.ts";
import { formatPercent } from "./format-quantity.ts";

type Judged = Pick<CheckSummary, "pLow" | "runsToSettle" | "flags">;

/**
 * How sure a verdict is, and what would settle it: `65 % sure the delivery is below the limit; 2
 * more runs would settle it.` Null while there is nothing to compare with.
 */
export function certaintySentence({ pLow, runsToSettle, flags }: Judged): string | null {
  if (pLow === null) return null;
  const below = pLow >= 0.5;
  const sure = formatPercent(below ? pLow : 1 - pLow);
  const words = `${sure} sure the delivery is ${below ? "below" : "above"} the limit`;
  const settles = settling(runsToSettle, flags);
  const sentence = settles ? `${words}; ${settles}.` : `${words}.`;
  return sentence.charAt(0).toUpperCase() + sentence.slice(1);
}

function settling(runs: number | null, flags: readonly string[]): string | null {
  if (runs === 0) return null;
  if (runs === 1) return "one more run would settle it";
  if (runs !== null) return `${runs} more runs would settle it`;
  return flags.includes("baseline-cannot-settle")
    ? "this baseline cannot settle it, so treat the delivery as low"
    : "this syringe cannot settle it";
}
