import type { BikeWithLog } from "../../../offline/index.ts";

/** A bike's whole log as a JSON file, oldest entry first: struck and foreign ones included. */
export function logFile({ record, log }: BikeWithLog): Blob {
  const { bikeId, details, summary } = record;
  const entries = log.map(({ entry }) => entry).toReversed();
  const file = { bikeId, details, summary, entries };
  return new Blob([JSON.stringify(file, null, 2)], { type: "application/json" });
}
