import type { RefusalReason } from "../../../shared/schemas/sync.ts";
import type { EntryRow, LogbookDatabase } from "./database.ts";

const passing: readonly RefusalReason[] = ["not-writable", "unknown-kind"];

/**
 * Refusals that time may lift: the bike may yet be registered or shared, the server may yet learn
 * the kind. The phone sends these again by itself, later.
 */
export const isPassing = (reason: RefusalReason): boolean => passing.includes(reason);

/** True where the server will not have this entry as it is, however often it is sent. */
export const isRefusedForGood = ({ refusal }: EntryRow): boolean =>
  refusal !== undefined && !isPassing(refusal.reason);

/** What a newer app wrote may have a body of any kind. */
const bodyOf = ({ entry }: EntryRow) => Object(entry.body) as Record<string, unknown>;

/** A strike names the entry; a bike's details, which nobody can strike, are all given once more. */
function settles(later: EntryRow, refused: EntryRow): boolean {
  if (later.entry.kind === "strike") return bodyOf(later).entryId === refused.entry.id;
  return (
    later.entry.kind === "bike" &&
    refused.entry.kind === "bike" &&
    later.savedAt > refused.savedAt &&
    Object.keys(bodyOf(refused)).every((field) => field in bodyOf(later))
  );
}

/**
 * Of a bike's log, what waits for the server or for its rider. An entry that was refused for good
 * and then struck, or written anew, waits for nobody.
 */
export function waitingRows(log: readonly EntryRow[]): EntryRow[] {
  const heeded = log.filter((row) => !isRefusedForGood(row));
  const isSettled = (row: EntryRow) =>
    isRefusedForGood(row) && heeded.some((later) => settles(later, row));
  return log.filter((row) => row.unsentSince !== undefined && !isSettled(row));
}

/** What waits, of all bikes, the oldest first. Whole logs are read only where one was refused. */
export async function readWaiting(database: LogbookDatabase): Promise<EntryRow[]> {
  const unsent = await database.getAllFromIndex("entries", "unsent");
  const doubtful = new Set(unsent.filter(isRefusedForGood).map(({ entry }) => entry.bikeId));
  if (doubtful.size === 0) return unsent;
  const logs = await Promise.all(
    [...doubtful].map((bikeId) => database.getAllFromIndex("entries", "bike", bikeId)),
  );
  const waiting = new Set(logs.flatMap(waitingRows).map(({ entry }) => entry.id));
  return unsent.filter(({ entry }) => !doubtful.has(entry.bikeId) || waiting.has(entry.id));
}
