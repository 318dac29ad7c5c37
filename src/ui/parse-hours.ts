import { parseDecimal } from "./parse-decimal.ts";

const HOURS_AND_MINUTES = /^(\d+):([0-5]?\d)$/;

/** Engine hours as typed: decimal (`2.5`, `2,5`) or hours and minutes (`2:30`). Null if neither. */
export function parseHours(text: string): number | null {
  const parts = HOURS_AND_MINUTES.exec(text.trim());
  return parts ? Number(parts[1]) + Number(parts[2]) / 60 : parseDecimal(text);
}
