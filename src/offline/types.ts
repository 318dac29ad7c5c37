import type { BikeDetails } from "../../shared/logbook/bike-details.ts";
import type { Entry, EntryEnvelope, LogEntry, Receipt } from "../../shared/schemas/entry.ts";
import type { Summary } from "../../shared/schemas/summary.ts";
import type { BikeAccess, RefusalReason } from "../../shared/schemas/sync.ts";

/** The account this phone is used with. It outlives the session: the app opens offline without one. */
export interface Account {
  id: string;
  name: string;
  email: string;
}

/** *Saved on this phone*, *Sent*, or refused by the server. */
export type EntryState =
  | { state: "saved" }
  | { state: "sent" }
  | { state: "refused"; reason: RefusalReason; errors?: Record<string, string> };

/** An entry of a kind or version that only a newer app understands: kept, shown as such. */
export type ForeignEntry = EntryEnvelope & Partial<Receipt>;

/** One line of a bike's log on this phone. */
export type KeptEntry = EntryState & {
  entry: LogEntry | ForeignEntry;
  /** False where this app is too old to read it. */
  understood: boolean;
  /** True where this account wrote it. */
  mine: boolean;
};

/** What the phone stored with a bike's log, so that the Shed judges nothing on its way up. */
export interface BikeRecord {
  bikeId: string;
  access: BikeAccess;
  details: BikeDetails;
  summary: Summary;
  /** Entries of this bike not yet sent, refused ones included. */
  unsent: number;
}

export interface SyncStatus {
  phase: "idle" | "sending" | "offline" | "signed-out";
  unsent: number;
  refused: number;
  /** ISO instant the oldest unsent entry was saved at. */
  oldestUnsentAt: string | null;
  lastSyncAt: string | null;
}

/** Entries as the forms hand them over: the id is made here, `at` by the form. */
export type NewEntry = Entry extends infer E
  ? E extends Entry
    ? Omit<E, "id" | "v">
    : never
  : never;
