/** How a test day's queue changes; nothing here is changed in place. */
import type { BikeRecord } from "../../../offline/index.ts";
import type { QueuedBike, TestDay } from "../../../offline/test-day.ts";
import type { BoardRow } from "../line-up/board.ts";

const asQueued = ({ bikeId, name, owner, tag }: BoardRow): QueuedBike => ({
  ...{ bikeId, name, owner: owner.name, tag },
  entryId: null,
});

/** At the end of the queue; a bike that stands in it stays where it is. */
export function addBikes(testDay: TestDay, rows: readonly BoardRow[]): TestDay {
  const queued = new Set(testDay.bikes.map(({ bikeId }) => bikeId));
  const added = rows.filter(({ bikeId }) => !queued.has(bikeId)).map(asQueued);
  return { ...testDay, bikes: [...testDay.bikes, ...added] };
}

export const takeOut = (testDay: TestDay, bikeId: string): TestDay => ({
  ...testDay,
  bikes: testDay.bikes.filter((bike) => bike.bikeId !== bikeId),
});

/** Whether a queued bike can be checked with no network. */
export type Readiness = "ready" | "awaited" | "gone";

export function readinessOf({ bikeId }: QueuedBike, bikes: readonly BikeRecord[]): Readiness {
  const bike = bikes.find((one) => one.bikeId === bikeId);
  if (!bike) return "gone";
  return bike.awaited ? "awaited" : "ready";
}
