/** Numbers with their units, as every screen shows them; the space before the unit never breaks. */
const withUnit = (number: string, unit: string) => `${number.replace("-", "−")}\u00a0${unit}`;

/** How many standard uncertainties *give or take* spans: about 19 readings of 20 lie within. */
export const GIVE_OR_TAKE = 2;

export const formatMl = (volumeMl: number) => withUnit(volumeMl.toFixed(2), "mL");

/** A delivery with its standard uncertainty, expanded: `2.50 ± 0.12 mL`. */
export const formatMlGiveOrTake = (volumeMl: number, uMl: number) =>
  `${volumeMl.toFixed(2)}\u00a0±\u00a0${formatMl(GIVE_OR_TAKE * uMl)}`;

/** A fraction in whole percent; what is not quite certain never shows as 0 or 100. */
export function formatPercent(fraction: number): string {
  const percent = Math.round(fraction * 100);
  if (percent === 0 && fraction > 0) return `under ${withUnit("1", "%")}`;
  if (percent === 100 && fraction < 1) return `over ${withUnit("99", "%")}`;
  return withUnit(String(percent), "%");
}

export const formatTemperature = (tempC: number) => withUnit(String(tempC), "°C");
