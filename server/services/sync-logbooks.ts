import type { SyncRequest, SyncResponse } from "../../shared/schemas/sync.ts";
import type { Store } from "../db/store.ts";
import { otherAccount } from "../problems.ts";
import { pullEntries } from "./pull-entries.ts";
import { pushEntries } from "./push-entries.ts";

/** Push, then pull: what was just stored comes back with its `rev`. */
export function syncLogbooks(store: Store, accountId: string, request: SyncRequest): SyncResponse {
  if (request.account !== undefined && request.account !== accountId) throw otherAccount();
  const results = pushEntries(store, accountId, request.entries);
  const { epoch, ...pulled } = pullEntries(store, accountId, request);
  return { epoch, results, ...pulled };
}
