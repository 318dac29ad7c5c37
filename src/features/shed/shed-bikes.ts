import type { BikeRecord, OpenCheck } from "../../offline/index.ts";

/** A bike as the Shed shows it, with what a check left half done on this phone says of it. */
export interface ShedBike extends BikeRecord {
  /** A check was begun and waits to be gone on with. */
  checkOpen: boolean;
  /** The engine must not be started. */
  hoseMaybeOff: boolean;
}

/** A hose that may be off is worse than any verdict. */
function rank({ summary, lineUp, hoseMaybeOff }: ShedBike): number {
  if (hoseMaybeOff) return 0;
  if (summary.action === "stop" || lineUp.stopAdvised) return 1;
  return summary.action === "repeat" ? 2 : 3;
}

/** The rider's own bikes, the worst first; among equals the one whose check comes first. */
export function shedBikes(
  bikes: readonly BikeRecord[],
  openChecks: readonly OpenCheck[],
): ShedBike[] {
  return bikes
    .filter((bike) => bike.access === "owner")
    .map((bike) => {
      const open = openChecks.find(({ bikeId }) => bikeId === bike.bikeId);
      const leftOpen = bike.summary.flags.includes("not-closed-out");
      return {
        ...bike,
        checkOpen: open !== undefined,
        hoseMaybeOff: leftOpen || open?.hoseMaybeOff === true,
      };
    })
    .sort((a, b) => rank(a) - rank(b) || a.summary.due.inHours - b.summary.due.inHours);
}
