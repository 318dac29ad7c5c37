/** From the stored row of an entry to a line of the log, and to what the logbook's functions read. */
import { entrySchema, type LogEntry, type Receipt } from "../../../shared/schemas/entry.ts";
import type { Account, EntryState, KeptEntry } from "../types.ts";
import type { EntryRow } from "./database.ts";

/** The entry as its author's phone made it, without what the server added. */
export function withoutReceipt(entry: EntryRow["entry"]): EntryRow["entry"] {
  const { author: _author, receivedAt: _receivedAt, rev: _rev, ...content } = entry;
  return content;
}

/** An entry with no author yet was written on this phone. */
export const isMine = ({ entry }: EntryRow, account: Account): boolean =>
  entry.author === undefined || entry.author.id === account.id;

function receiptOf({ author, receivedAt, rev }: EntryRow["entry"], account: Account) {
  const receipt: Partial<Receipt> = { author: author ?? { id: account.id, name: account.name } };
  return receivedAt === undefined ? receipt : { ...receipt, receivedAt, rev };
}

/** The entry if this version of the app can read it; null if only a newer one can. */
export function readEntry(row: EntryRow, account: Account): LogEntry | null {
  const parsed = entrySchema.safeParse(withoutReceipt(row.entry));
  return parsed.success ? { ...parsed.data, ...receiptOf(row.entry, account) } : null;
}

function stateOf(row: EntryRow): EntryState {
  if (row.refusal) return { state: "refused", ...row.refusal };
  return { state: row.unsentSince === undefined ? "sent" : "saved" };
}

export function asKeptEntry(row: EntryRow, account: Account): KeptEntry {
  const entry = readEntry(row, account);
  return {
    ...(entry ? { understood: true, entry } : { understood: false, entry: row.entry }),
    ...stateOf(row),
    mine: isMine(row, account),
    savedAt: row.savedAt,
  };
}
