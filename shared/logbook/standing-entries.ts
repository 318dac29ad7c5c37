import { ENTRY_VERSION, entryKinds, type LogEntry } from "../schemas/entry.ts";
import { byEffectiveOrder } from "./effective-order.ts";

export interface StandingEntries {
  /** Entries that count, in effective order: known to this version, each once, none struck. */
  standing: LogEntry[];
  /** Ids of entries struck by someone who may. */
  struck: Set<string>;
}

const isKnown = (entry: LogEntry) =>
  entry.v === ENTRY_VERSION && (entryKinds as string[]).includes(entry.kind);

/**
 * Which entries of a bike count. A strike is honoured if it was written by the bike's owner or by
 * the struck entry's author, and never for a `bike` or `strike` entry; it may come before its
 * target. An entry with no author yet was written on this phone and counts as the owner's.
 * Entries of an unknown kind or version are left out, not dropped: an older app keeps them.
 */
export function standingEntries(ownerId: string, entries: readonly LogEntry[]): StandingEntries {
  const once = new Map<string, LogEntry>();
  for (const entry of entries) {
    // The copy with the server's receipt wins over the one still without.
    if (isKnown(entry) && (entry.receivedAt !== undefined || !once.has(entry.id)))
      once.set(entry.id, entry);
  }
  const authorOf = (entry: LogEntry) => entry.author?.id ?? ownerId;
  const struck = new Set<string>();
  for (const strike of once.values()) {
    if (strike.kind !== "strike") continue;
    const target = once.get(strike.body.entryId);
    if (!target || target.kind === "bike" || target.kind === "strike") continue;
    const by = authorOf(strike);
    if (by === ownerId || by === authorOf(target)) struck.add(target.id);
  }
  const standing = [...once.values()].filter((entry) => !struck.has(entry.id));
  return { standing: standing.sort(byEffectiveOrder), struck };
}
