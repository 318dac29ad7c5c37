/**
 * The schema of an account's logbook in IndexedDB. Versions only ever add: an older app's entries
 * stay where they are and stay readable.
 */
import { openDB, type DBSchema, type IDBPDatabase, type IDBPTransaction } from "idb";
import type { LogEntry, Syringe } from "../../../shared/schemas/entry.ts";
import type { RefusalReason } from "../../../shared/schemas/sync.ts";
import type { BikeRecord, Draft, ForeignEntry } from "../types.ts";

const DATABASE_VERSION = 1;
/** The shape of the stored summaries. Raise it when an older one could not be shown any more. */
export const BIKE_ROW_FORMAT = 2;

/** A line of the log. It stays for ever after it was sent: the log is the outbox with a mark. */
export interface EntryRow {
  entry: LogEntry | ForeignEntry;
  savedAt: string;
  /** When it was saved, for as long as it is not sent; indexed, so sent rows cost nothing to skip. */
  unsentSince?: string;
  refusal?: { reason: RefusalReason; errors?: Record<string, string> };
}

export interface BikeRow extends BikeRecord {
  /** The highest `rev` this phone was sent; 0 where the server has sent none. */
  rev: number;
  format: number;
  /** The build whose code made the summary; empty where an entry is not in it yet. */
  builtWith: string;
}

export interface SyringeRow {
  id: string;
  syringe: Syringe;
  /** When it was last used, changed or retired: the latest word on it counts. */
  changedAt: string;
  retired: boolean;
}

export interface SyncRow {
  id: "sync";
  /** The database the server answered from; another one answers after a restore. */
  epoch: string;
  lastSyncAt: string;
}

export interface LogbookSchema extends DBSchema {
  entries: { key: string; value: EntryRow; indexes: { bike: string; unsent: string } };
  bikes: { key: string; value: BikeRow };
  syringes: { key: string; value: SyringeRow };
  drafts: { key: [string, string]; value: Draft; indexes: { bike: string } };
  meta: { key: string; value: SyncRow };
}

export type LogbookDatabase = IDBPDatabase<LogbookSchema>;
export type LogbookStore = "entries" | "bikes" | "syringes" | "drafts" | "meta";
/** A transaction that may change the log and what is computed from it. */
export type LogbookChange = IDBPTransaction<LogbookSchema, LogbookStore[], "readwrite">;

export interface ClosingHooks {
  /** A newer version of the app waits for this connection to close. */
  blocking(database: LogbookDatabase): void;
  terminated(): void;
}

export async function openDatabase(name: string, hooks: ClosingHooks): Promise<LogbookDatabase> {
  const database = await openDB<LogbookSchema>(name, DATABASE_VERSION, {
    upgrade(database, oldVersion) {
      if (oldVersion < 1) {
        const entries = database.createObjectStore("entries", { keyPath: "entry.id" });
        entries.createIndex("bike", "entry.bikeId");
        entries.createIndex("unsent", "unsentSince");
        database.createObjectStore("bikes", { keyPath: "bikeId" });
        database.createObjectStore("syringes", { keyPath: "id" });
        const drafts = database.createObjectStore("drafts", { keyPath: ["bikeId", "form"] });
        drafts.createIndex("bike", "bikeId");
        database.createObjectStore("meta", { keyPath: "id" });
      }
    },
    blocking: () => hooks.blocking(database),
    terminated: () => hooks.terminated(),
  });
  return database;
}
