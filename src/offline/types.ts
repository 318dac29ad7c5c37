import type { BikeDetails } from "../../shared/logbook/bike-details.ts";
import type { AdviceNote } from "../../shared/logbook/standing-advice.ts";
import type { LineUpFacts } from "../../shared/schemas/club.ts";
import type {
  Entry,
  EntryEnvelope,
  LogEntry,
  Receipt,
  Syringe,
} from "../../shared/schemas/entry.ts";
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
export type KeptEntry = EntryState &
  (
    | { understood: true; entry: LogEntry }
    /** This app is too old to read it. */
    | { understood: false; entry: ForeignEntry }
  ) & {
    /** True where this account wrote it. */
    mine: boolean;
    /** ISO instant at which this phone stored it. */
    savedAt: string;
  };

/** What the phone stored with a bike's log, so that the Shed judges nothing on its way up. */
export interface BikeRecord {
  bikeId: string;
  access: BikeAccess;
  /** Whose strikes always count. */
  ownerId: string;
  /** Asked for, while nothing of its log has reached this phone. */
  awaited: boolean;
  details: BikeDetails;
  summary: Summary;
  /** What a club's Line-up shows of it. */
  lineUp: LineUpFacts;
  /** The advice that stands; null where nobody advised anything. */
  advice: AdviceNote | null;
  /** Entries of this bike not yet sent; of those refused for good, the ones not yet mended. */
  unsent: number;
}

/** A bike with its whole log, the newest line first. */
export interface BikeWithLog {
  record: BikeRecord;
  log: KeptEntry[];
}

export interface SyncStatus {
  phase: "idle" | "sending" | "offline" | "signed-out";
  /** Entries not yet sent; of those refused for good, the ones not yet mended. */
  unsent: number;
  refused: number;
  /** ISO instant the oldest unsent entry was saved at. */
  oldestUnsentAt: string | null;
  lastSyncAt: string | null;
}

/**
 * Whether the browser promised to keep what this phone holds. *refused*: it may throw unsent
 * entries away when it runs short of room; *unavailable*: it keeps nothing (a private window).
 */
export type StorageHealth = "unasked" | "persisted" | "refused" | "unavailable";

/** A form half filled in. `content` is whatever the form wrote: parse it before use. */
export interface Draft {
  bikeId: string;
  /** Which form: "check", "note" … */
  form: string;
  content: unknown;
  savedAt: string;
}

export type { Syringe };

/** Entries as the forms hand them over: the id is made here, `at` by the form. */
export type NewEntry = Entry extends infer E
  ? E extends Entry
    ? Omit<E, "id" | "v">
    : never
  : never;
