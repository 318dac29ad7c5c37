import type { LogEntry } from "../../../shared/schemas/entry.ts";
import { isPassing, type KeptEntry } from "../../offline/index.ts";

/** True where the server will not have an entry as it is, however often it is sent. */
export function isRefusedForGood(kept: KeptEntry): boolean {
  return kept.state === "refused" && !isPassing(kept.reason);
}

/** The entries of a log that its summary was made from. */
export function countedEntries(log: readonly KeptEntry[]): LogEntry[] {
  return log.flatMap((kept) => (kept.understood && !isRefusedForGood(kept) ? kept.entry : []));
}
