import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { parseHours } from "../../../ui/parse-hours.ts";

/**
 * What was typed, as an entry holds it. What is no number becomes NaN, which no schema accepts: its
 * sentence about the field is the one that the rider reads.
 */
export const typedNumber = (text: string): number => parseDecimal(text) ?? NaN;

/** A number that may be left empty. */
export const optionalNumber = (text: string): number | undefined =>
  text.trim() === "" ? undefined : typedNumber(text);

/** Engine hours; null where left empty. `12:` on an hh:mm meter is twelve hours. */
export function typedHours(text: string): number | null {
  const typed = text.trim().replace(/:$/, "");
  return typed === "" ? null : (parseHours(typed) ?? NaN);
}

export const optionalText = (text: string): string | undefined => text.trim() || undefined;
