import type { MeterFormat } from "../../../../shared/schemas/entry.ts";
import type { Trend } from "../../../../shared/schemas/summary.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatMl } from "../../../ui/format-quantity.ts";

/** What can be told of how the delivery changes. */
export function trendSentence(trend: Trend | null, meterFormat: MeterFormat): string {
  if (!trend) return "Three checks over at least ten hours make a trend.";
  const { perHour, reachesLimitAtHours, range } = trend;
  if (reachesLimitAtHours === null) return "No decline can be told from the checks' scatter.";
  const hours = (value: number) => `${formatHours(value, meterFormat)}\u00a0h`;
  const falls = `Delivery falls by ${formatMl(-10 * perHour)} a run in 10\u00a0h`;
  const meets = `the trend meets the limit at about ${hours(reachesLimitAtHours)}`;
  const between = range ? `, between ${hours(range.low)} and ${hours(range.high)}` : "";
  return `${falls}: ${meets}${between}.`;
}
