import type { MeterFormat } from "../../shared/schemas/entry.ts";

/**
 * Engine hours as the bike's meter shows them, without the unit: one decimal (`12.5`), or hours
 * and minutes (`12:30`). Also what HoursField starts from.
 */
export function formatHours(hours: number, meterFormat: MeterFormat = "decimal"): string {
  const sign = hours < 0 ? "−" : "";
  const size = Math.abs(hours);
  if (meterFormat === "decimal") {
    const shown = size.toFixed(1);
    return (shown === "0.0" ? "" : sign) + shown;
  }
  const minutes = Math.round(size * 60);
  const rest = String(minutes % 60).padStart(2, "0");
  return `${minutes === 0 ? "" : sign}${Math.floor(minutes / 60)}:${rest}`;
}
