import { describe, expect, it } from "vitest";
import { lineUpFacts } from "../../../../shared/logbook/line-up-facts.ts";
import { bikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import type { LineUpRow } from "../../../../shared/schemas/club.ts";
import type { LogEntry } from "../../../../shared/schemas/entry.ts";
import { bikeEntry, checkEntry } from "../../../../tests/helpers/make-entry.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { boardOf } from "./board.ts";

const [moss, fern] = [
  "0193a000-0000-7000-8000-000000000001",
  "0193a000-0000-7000-8000-000000000002",
];
const owner = { id: "wren", name: "Wren" };

/** A bike as a phone keeps it, with what its log says. */
function recordOf(bikeId: string, endMl: number[], more: Partial<BikeRecord> = {}): BikeRecord {
  const at = (index: number) => `2026-0${index + 2}-01T09:00:00.000Z`;
  const checks = endMl.map((end, index) => checkEntry(bikeId, 12 + 20 * index, end, at(index)));
  const entries = [bikeEntry(bikeId, { name: bikeId }), ...checks] as LogEntry[];
  const logbook = { ownerId: owner.id, entries };
  const summary = summariseLogbook(logbook);
  return {
    ...{ bikeId, access: "mechanic", ownerId: owner.id, awaited: false, unsent: 0, advice: null },
    details: bikeDetails(entries),
    summary,
    lineUp: lineUpFacts(logbook, summary),
    ...more,
  };
}

const asRow = ({ lineUp }: BikeRecord): LineUpRow => ({ ...lineUp, owner });
const sound = [3, 2.98];
const low = [3, 1.5];
const lineUp = [asRow(recordOf(moss, sound)), asRow(recordOf(fern, sound))];
const placesOf = (board: ReturnType<typeof boardOf>) =>
  board.map(({ bikeId, place }) => [bikeId, place]);

describe("boardOf", () => {
  it("shows what the server said of bikes that are not on this phone", () => {
    expect(boardOf({ lineUp, toldAt: 2, bikes: [], syncedAt: 1 })).toEqual(
      lineUp.map((row) => ({ ...row, unsent: 0 })),
    );
  });

  it("moves a bike that was found low with no network to the top", () => {
    const bikes = [recordOf(fern, low, { unsent: 1 })];
    const board = boardOf({ lineUp, toldAt: 2, bikes, syncedAt: 1 });
    expect(placesOf(board)).toEqual([
      [fern, "stop"],
      [moss, "holding"],
    ]);
    expect(board[0]).toMatchObject({ owner, unsent: 1 });
  });

  it("believes the log of a later exchange, and the server's later word", () => {
    const bikes = [recordOf(fern, low)];
    const after = boardOf({ lineUp, toldAt: 1, bikes, syncedAt: 2 });
    expect(placesOf(after)[0]).toEqual([fern, "stop"]);
    const before = boardOf({ lineUp, toldAt: 2, bikes, syncedAt: 1 });
    expect(placesOf(before).map(([, place]) => place)).toEqual(["holding", "holding"]);
  });

  it("takes nothing from a bike whose log is not here yet", () => {
    const awaited = { ...recordOf(fern, []), awaited: true };
    const board = boardOf({ lineUp, toldAt: 1, bikes: [awaited], syncedAt: 2 });
    expect(board.map(({ name }) => name)).toEqual([moss, fern]);
  });
});
