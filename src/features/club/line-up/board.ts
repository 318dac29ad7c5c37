import { lineUpOrder, type LineUpRow } from "../../../../shared/schemas/club.ts";
import type { BikeRecord } from "../../../offline/index.ts";

/** A bike on the board, with what this phone has written about it and not sent yet. */
export interface BoardRow extends LineUpRow {
  unsent: number;
}

interface Known {
  /** What the server last said, and when, ms. */
  lineUp: readonly LineUpRow[];
  toldAt: number;
  /** The bikes on this phone, and when it last agreed with the server about them, ms. */
  bikes: readonly BikeRecord[];
  syncedAt: number;
}

/** As the server orders it: worst first, then by the fewest hours left. */
const byPlace = (a: LineUpRow, b: LineUpRow) =>
  lineUpOrder.indexOf(a.place) - lineUpOrder.indexOf(b.place) ||
  a.dueInHours - b.dueInHours ||
  (a.bikeId < b.bikeId ? -1 : 1);

/**
 * The board as it stands: a bike whose log is on this phone shows what that log says, where that
 * is newer than the server's word: after a check written with no network, or a later exchange.
 */
export function boardOf({ lineUp, toldAt, bikes, syncedAt }: Known): BoardRow[] {
  const here = new Map(bikes.filter((bike) => !bike.awaited).map((bike) => [bike.bikeId, bike]));
  return lineUp
    .map((row) => {
      const bike = here.get(row.bikeId);
      const unsent = bike?.unsent ?? 0;
      const newer = bike && (unsent > 0 || syncedAt > toldAt);
      return { ...row, ...(newer && bike.lineUp), unsent };
    })
    .sort(byPlace);
}
