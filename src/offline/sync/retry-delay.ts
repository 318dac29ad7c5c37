const BASE_MS = 2_000;
const CEILING_MS = 5 * 60_000;
/** A server that asks for longer is taken at its word for an hour at a time. */
const LONGEST_WAIT_MS = 60 * 60_000;

/**
 * How long to wait before the next try, ms: anything between nothing and a ceiling that doubles
 * with each failure up to 5 minutes (full jitter, so that phones coming back together do not stay
 * together), and at least what the server asked for.
 *
 * @param failures failures in a row so far, this one included
 * @param random between 0 and 1
 */
export function retryDelayMs(failures: number, random: number, retryAfterMs: number | null) {
  const ceiling = Math.min(CEILING_MS, BASE_MS * 2 ** (failures - 1));
  return Math.max(random * ceiling, Math.min(retryAfterMs ?? 0, LONGEST_WAIT_MS));
}
