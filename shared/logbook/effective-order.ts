import type { LogEntry } from "../schemas/entry.ts";

/**
 * When an entry counts as having happened, ms since 1970: the earlier of the phone's `at` and the
 * server's `receivedAt`, so that a phone whose clock runs ahead cannot write into the future.
 */
export function effectiveTime(entry: Pick<LogEntry, "at" | "receivedAt">): number {
  const at = Date.parse(entry.at);
  return entry.receivedAt === undefined ? at : Math.min(at, Date.parse(entry.receivedAt));
}

/** Orders entries as the logbook reads them: by effective time, then by id. */
export function byEffectiveOrder(a: LogEntry, b: LogEntry): number {
  return effectiveTime(a) - effectiveTime(b) || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);
}
