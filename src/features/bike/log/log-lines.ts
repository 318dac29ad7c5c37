import { standingEntries } from "../../../../shared/logbook/standing-entries.ts";
import {
  entryKinds,
  type EntryKind,
  type LogEntry,
  type LogEntryOf,
} from "../../../../shared/schemas/entry.ts";
import type { BikeRecord, KeptEntry } from "../../../offline/index.ts";
import { isRefusedForGood } from "../counted-entries.ts";

export interface LogLine {
  kept: KeptEntry;
  /** The strike that rules it through. */
  struckBy: LogEntryOf<"strike"> | null;
  /** For a strike: the entry it strikes, where this phone has it. */
  strikes: KeptEntry | null;
  /** Whether this account may strike it. */
  canStrike: boolean;
}

/** A refused entry may be struck out of sight; a strike that was refused strikes nothing. */
function heeded(kept: KeptEntry): LogEntry[] {
  if (!kept.understood) return [];
  return kept.entry.kind === "strike" && isRefusedForGood(kept) ? [] : [kept.entry];
}

/** The lines of a log, newest first, each with what its neighbours say of it. */
export function logLines(record: BikeRecord, log: readonly KeptEntry[]): LogLine[] {
  const { struck } = standingEntries(record.ownerId, log.flatMap(heeded));
  const byId = new Map(log.map((kept) => [kept.entry.id, kept]));
  const strikes = new Map<string, LogEntryOf<"strike">>();
  for (const kept of log) {
    const { understood, entry } = kept;
    // The log runs backwards: the strike that came first is the one that stays.
    if (understood && entry.kind === "strike" && struck.has(entry.body.entryId))
      strikes.set(entry.body.entryId, entry);
  }
  return log.map((kept) => {
    const { entry, understood } = kept;
    const struckBy = strikes.get(entry.id) ?? null;
    const isStrike = understood && entry.kind === "strike";
    return {
      kept,
      struckBy,
      strikes: isStrike ? (byId.get(entry.body.entryId) ?? null) : null,
      canStrike:
        understood &&
        struckBy === null &&
        entry.kind !== "bike" &&
        entry.kind !== "strike" &&
        (record.access === "owner" || kept.mine),
    };
  });
}

/** The kinds that a log holds, in their usual order, for the filter to offer. */
export function kindsIn(lines: readonly LogLine[]): EntryKind[] {
  const present = new Set(lines.map(({ kept }) => kept.entry.kind));
  return entryKinds.filter((kind) => present.has(kind));
}
