import type { LogEntry } from "../../../shared/schemas/entry.ts";
import type { RefusalReason } from "../../../shared/schemas/sync.ts";
import type { KeptEntry } from "../../offline/index.ts";

/** Refusals that time may lift: the phone sends these entries again by itself. */
const passingRefusals: readonly RefusalReason[] = ["not-writable", "unknown-kind"];

/** True where the server will not have an entry as it is, however often it is sent. */
export function isRefusedForGood(kept: KeptEntry): boolean {
  return kept.state === "refused" && !passingRefusals.includes(kept.reason);
}

/** The entries of a log that its summary was made from. */
export function countedEntries(log: readonly KeptEntry[]): LogEntry[] {
  return log.flatMap((kept) => (kept.understood && !isRefusedForGood(kept) ? kept.entry : []));
}
