import { describe, expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import type { LogEntry } from "../schemas/entry.ts";
import { standingEntries } from "./standing-entries.ts";

const MECHANIC = { id: "mechanic", name: "Mechanic" };
const struckIn = (entries: LogEntry[]) => [...standingEntries("owner", entries).struck];

describe("standingEntries", () => {
  it("leaves out what its owner struck, also when the strike comes first", () => {
    const book = logbook().hours(12);
    const target = book.lastId;
    book.strike(target);
    expect(struckIn(book.entries)).toEqual([target]);
    expect(struckIn(book.entries.toReversed())).toEqual([target]);
  });

  it("honours a mechanic's strike of the mechanic's own entry only", () => {
    const book = logbook().hours(12).hours(13);
    const [owners, mechanics] = book.entries.map(({ id }) => id) as [string, string];
    book.strike(owners).strike(mechanics);
    const entries = book.entries.map((entry, i) =>
      i === 0 ? entry : { ...entry, author: MECHANIC },
    );
    expect(struckIn(entries)).toEqual([mechanics]);
  });

  it("never strikes a bike entry or a strike", () => {
    const book = logbook().bike({ name: "Moss" });
    const bike = book.lastId;
    book.strike(bike);
    book.strike(book.lastId);
    expect(struckIn(book.entries)).toEqual([]);
  });

  it("keeps each entry once, preferring the copy with the server's receipt", () => {
    const [entry] = logbook().hours(12, {}, "2099-01-01T00:00:00Z").entries as [LogEntry];
    const { receivedAt: _, rev: __, ...unsent } = entry;
    const received = { ...entry, receivedAt: "2026-03-01T00:00:00.000Z" };
    for (const copies of [
      [unsent, received],
      [received, unsent, received],
    ])
      expect(standingEntries("owner", copies as LogEntry[]).standing).toEqual([received]);
  });

  it("leaves out kinds and versions that it does not know", () => {
    const [entry] = logbook().hours(12).entries as [LogEntry];
    const newer = { ...entry, v: 2 } as unknown as LogEntry;
    const unknown = { ...entry, id: "0190a000-0000-7000-9000-0000000000ff", kind: "photo" };
    const { standing } = standingEntries("owner", [newer, unknown as unknown as LogEntry]);
    expect(standing).toEqual([]);
  });

  it("orders by the earlier of at and receivedAt, then by id", () => {
    const book = logbook().note("a").note("b").note("c");
    const [a, b, c] = book.entries as [LogEntry, LogEntry, LogEntry];
    const fastClock = { ...a, at: "2099-01-01T00:00:00Z", receivedAt: "2026-04-01T00:00:00Z" };
    const sameTime = { ...c, at: b.at, receivedAt: b.receivedAt! };
    const { standing } = standingEntries("owner", [fastClock, sameTime, b]);
    expect(standing.map(({ id }) => id)).toEqual([b.id, c.id, a.id]);
  });
});
