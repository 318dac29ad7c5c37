import { isDeepStrictEqual } from "node:util";
import type { Entry } from "../../shared/schemas/entry.ts";
import type { EntryRow } from "../db/entries.ts";

/** Whether a stored entry is the one now sent, by the same author; the order of keys says nothing. */
export function isSameEntry(stored: EntryRow, entry: Entry, authorId: string): boolean {
  const { rev: _rev, receivedAt: _receivedAt, ...kept } = stored;
  // Through JSON, as the stored one went: it makes 0 of −0.
  const sent: unknown = JSON.parse(JSON.stringify({ ...entry, authorId }));
  return isDeepStrictEqual(kept, sent);
}
