import { parseDecimal } from "./parse-decimal.ts";

/** A fuel:oil ratio as typed: `80:1`, `1:80` and `80` are all 80. Null where it is none. */
export function parseRatio(text: string): number | null {
  const parts = text.split(":").map(parseDecimal);
  const [first = null, second = 1] = parts;
  if (parts.length > 2 || first === null || second === null || first <= 0 || second <= 0)
    return null;
  return Math.max(first / second, second / first);
}
