import type { BikeWithLog } from "../../../offline/index.ts";
import type { QueuedBike, TestDay } from "../../../offline/test-day.ts";

/** A bike at the station of a test day. */
export interface StationProps {
  clubId: string;
  testDay: TestDay;
  queued: QueuedBike;
  bike: BikeWithLog;
}

/** `Wren · 7KMX4P · 3 of 60` */
export function placeInQueue({ testDay, queued }: StationProps): string {
  const place = testDay.bikes.findIndex(({ bikeId }) => bikeId === queued.bikeId) + 1;
  return `${queued.owner} · ${queued.tag} · ${place} of ${testDay.bikes.length}`;
}

/** Who comes next: the first who waits, this one apart. */
export const nextInQueue = ({ testDay, queued }: StationProps): QueuedBike | null =>
  testDay.bikes.find(({ bikeId, entryId }) => bikeId !== queued.bikeId && entryId === null) ?? null;
