import type { SyncRequest, SyncResponse } from "../../shared/schemas/sync.ts";
import { otherAccount } from "../problems.ts";
import type { MailParts } from "./mail-parts.ts";
import { pullEntries } from "./pull-entries.ts";
import { pushEntries } from "./push-entries.ts";
import { mailStop, mailStopAdvice } from "./stop-mails.ts";

/** Push, then pull: what was just stored comes back with its `rev`. */
export function syncLogbooks(
  parts: MailParts,
  accountId: string,
  request: SyncRequest,
): SyncResponse {
  if (request.account !== undefined && request.account !== accountId) throw otherAccount();
  const results = pushEntries(parts.store, accountId, request.entries, ({ summary, advice }) => {
    mailStop(parts, summary);
    mailStopAdvice(parts, summary, advice);
  });
  const { epoch, ...pulled } = pullEntries(parts.store, accountId, request);
  return { epoch, results, ...pulled };
}
