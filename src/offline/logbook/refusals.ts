import type { RefusalReason } from "../../../shared/schemas/sync.ts";
import type { EntryRow } from "./database.ts";

/**
 * Refusals that time may lift: the bike may yet be registered or shared, the server may yet learn
 * the kind. The phone sends these again by itself, later.
 */
const passing: readonly RefusalReason[] = ["not-writable", "unknown-kind"];

/** True where the server will not have this entry as it is, however often it is sent. */
export const isRefusedForGood = ({ refusal }: EntryRow): boolean =>
  refusal !== undefined && !passing.includes(refusal.reason);
