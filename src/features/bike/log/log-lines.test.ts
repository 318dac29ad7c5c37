import { describe, expect, it } from "vitest";
import type { LogEntry } from "../../../../shared/schemas/entry.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import type { BikeRecord, KeptEntry } from "../../../offline/index.ts";
import { kindsIn, logLines } from "./log-lines.ts";

const kept = (entry: LogEntry, more: Partial<KeptEntry> = {}) =>
  ({ understood: true, entry, state: "sent", mine: true, savedAt: entry.at, ...more }) as KeptEntry;
const record = (access: BikeRecord["access"] = "owner") =>
  ({ ownerId: "owner", access }) as BikeRecord;
const newestFirst = (entries: LogEntry[]) => entries.toReversed().map((entry) => kept(entry));

describe("logLines", () => {
  const book = logbook().bike({ name: "Moss" }).hours(12).hours(320);
  const struckId = book.lastId;
  book.strike(struckId, "320 for 32.0").strike(struckId, "again").note("Smoke");
  const lines = logLines(record(), newestFirst(book.entries));
  const line = (id: string) => lines.find((one) => one.kept.entry.id === id)!;

  it("keeps the order and rules a struck entry through, with the first reason", () => {
    expect(lines.map(({ kept }) => kept.entry.kind)).toEqual([
      "note",
      "strike",
      "strike",
      "hours",
      "hours",
      "bike",
    ]);
    expect(line(struckId).struckBy?.body.reason).toBe("320 for 32.0");
    expect(lines[1]?.strikes?.entry.id).toBe(struckId);
  });

  it("lets the owner strike what stands, but no details, no strike and nothing twice", () => {
    expect(lines.map(({ canStrike }) => canStrike)).toEqual([
      true,
      false,
      false,
      false,
      true,
      false,
    ]);
  });

  it("lets a mechanic strike only their own entries", () => {
    const [mine, other] = book.entries.filter(({ kind }) => kind === "hours");
    const log = [kept(mine!), kept(other!, { mine: false })];
    expect(logLines(record("mechanic"), log).map(({ canStrike }) => canStrike)).toEqual([
      true,
      false,
    ]);
  });

  it("heeds no strike that the server refused for good", () => {
    const log = book.entries.map((entry) =>
      kept(entry, entry.kind === "strike" ? { state: "refused", reason: "invalid" } : {}),
    );
    expect(logLines(record(), log).every(({ struckBy }) => struckBy === null)).toBe(true);
  });

  it("rules through a refused entry that was written anew", () => {
    const log = book.entries.map((entry) =>
      kept(entry, entry.id === struckId ? { state: "refused", reason: "id-taken" } : {}),
    );
    const refused = logLines(record(), log).find((one) => one.kept.entry.id === struckId);
    expect(refused).toMatchObject({ struckBy: { kind: "strike" }, canStrike: false });
  });

  it("keeps an entry of a newer version, which nobody can strike", () => {
    const photo = { ...book.entries[1]!, kind: "photo", v: 2 };
    const log = [kept(photo as never, { understood: false })];
    expect(logLines(record(), log)).toMatchObject([{ canStrike: false, struckBy: null }]);
    expect(kindsIn(logLines(record(), log))).toEqual([]);
  });

  it("offers the kinds that are there to the filter", () => {
    expect(kindsIn(lines)).toEqual(["bike", "hours", "note", "strike"]);
  });
});
