import type { MeterFormat } from "../../../../shared/schemas/entry.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatMl } from "../../../ui/format-quantity.ts";
import type { HistorySeries } from "../history/delivery-history.ts";

/** `Pump renewed, 120.0 h. Baseline 3.01 mL.` */
export function seriesHeading(series: HistorySeries, meterFormat: MeterFormat): string {
  const { cause, atHours, baseline, holdsToEarlier } = series;
  const at = atHours === null ? "" : `, ${formatHours(atHours, meterFormat)}\u00a0h`;
  if (!baseline) return `${cause}${at}. No baseline yet.`;
  const held = holdsToEarlier ? "Held to the earlier baseline of" : "Baseline";
  return `${cause}${at}. ${held} ${formatMl(baseline.perRunMl)}.`;
}
