/** A reading lies within half a graduation of the truth, rectangular: g/√12 (GUM 4.3.7). */
const PER_READING = 1 / Math.sqrt(12);

/**
 * Standard uncertainty, mL a run, that reading the marks gives to the mean of `runs` runs: only the
 * first and the last level of each barrel fill are readings that matter.
 *
 * Formula: √(2·fills)·g/√12/n. Source: GUM (JCGM 100), 4.3.7 and 5.1.2.
 *
 * @example readingUncertaintyMl({ fills: 1, graduationMl: 0.2, runs: 1 }) // 0.0816
 */
export function readingUncertaintyMl(reading: {
  fills: number;
  graduationMl: number;
  runs: number;
}): number {
  return (Math.sqrt(2 * reading.fills) * reading.graduationMl * PER_READING) / reading.runs;
}
