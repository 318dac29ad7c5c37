const DECIMAL = /^[-−]?(\d+([.,]\d*)?|[.,]\d+)$/;

/**
 * The number that a rider typed, or null where it is none. `3,8` and `3.8` are the same; a second
 * mark (`1,234.5`) is not guessed at.
 */
export function parseDecimal(text: string): number | null {
  const typed = text.trim();
  if (!DECIMAL.test(typed)) return null;
  return Number(typed.replace("−", "-").replace(",", "."));
}
