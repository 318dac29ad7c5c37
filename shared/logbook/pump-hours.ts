import type { LogEntry } from "../schemas/entry.ts";
import type { LifetimeHours } from "./lifetime-hours.ts";

const renewsPump = (entry: LogEntry) =>
  entry.kind === "work" && entry.body.items.includes("pump-renewed");

/**
 * Engine hours on the present pump: lifetime hours now less those when a pump was last renewed.
 * Input: the standing entries in effective order, and their lifetime hours.
 * Edges: null where the log knows of no renewal (the hours before it began are not known); never
 * below 0, also while the readings are doubted.
 *
 * @example pumpHours([work pump-renewed at 139.7, hours 167.9], hours) // 28.2
 */
export function pumpHours(standing: readonly LogEntry[], hours: LifetimeHours): number | null {
  const renewal = standing.findLast(renewsPump);
  const atHours = renewal && hours.atHours.get(renewal.id);
  if (atHours === undefined || hours.now === null) return null;
  return Math.max(0, hours.now - atHours);
}
