import type { Action, EntryKind, Verdict } from "../../shared/schemas/entry.ts";
import type { RefusalReason } from "../../shared/schemas/sync.ts";

/** Always *delivery low*, never just *low*: it must not read as the oil level. */
export const verdictWords: Record<Verdict, string> = {
  none: "No check yet",
  settling: "Delivery settling",
  holding: "Delivery holding",
  dropping: "Delivery dropping",
  low: "Delivery low",
};

export const actionWords: Record<Action, string> = {
  ride: "Ride on",
  repeat: "Repeat before riding",
  stop: "Stop, find the cause",
};

/** Beside the words, never in their place. */
export const actionInks: Record<Action, string> = {
  ride: "text-holding",
  repeat: "text-dropping",
  stop: "text-low",
};

export const kindWords: Record<EntryKind, string> = {
  bike: "Bike details",
  hours: "Hours",
  check: "Delivery check",
  work: "Work done",
  meter: "Meter change",
  topup: "Top-up",
  note: "Note",
  strike: "Entry struck",
};

/** Why the server did not accept an entry, and what becomes of it. */
export const refusalWords: Record<RefusalReason, string> = {
  invalid: "Something in it does not fit. Strike it, and write it down anew.",
  "id-taken": "The server has another entry under the same id. Write it down anew.",
  "not-writable": "This bike does not take entries from you at present. It is sent again later.",
  erased: "What it belonged to was erased.",
  "unknown-kind": "The server does not know this kind of entry yet. It is sent again later.",
};
