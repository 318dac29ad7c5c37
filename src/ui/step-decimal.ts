import { parseDecimal } from "./parse-decimal.ts";

const decimalsOf = (text: string) => text.split(/[.,]/)[1]?.length ?? 0;

export interface StepLimits {
  min?: number;
  max?: number;
}

/**
 * The text of a number field one step up or down, as fine as what stands there: 3.75 less 0.1 is
 * 3.65. What is no number counts as 0.
 */
export function stepDecimal(text: string, by: number, limits: StepLimits = {}): string {
  const { min = -Infinity, max = Infinity } = limits;
  const from = parseDecimal(text);
  const decimals = Math.max(decimalsOf(String(by)), from === null ? 0 : decimalsOf(text.trim()));
  return Math.min(max, Math.max(min, (from ?? 0) + by)).toFixed(decimals);
}
