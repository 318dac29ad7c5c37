import type { SyncRequest, SyncResponse } from "../../shared/schemas/sync.ts";
import { otherAccount } from "../problems.ts";
import { withdrawDue } from "./due-mails.ts";
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
  const { store } = parts;
  const results = pushEntries(store, accountId, request.entries, ({ summary, lineUp, advice }) => {
    mailStop(parts, summary);
    mailStopAdvice(parts, summary, advice);
    withdrawDue(store, lineUp);
  });
  const { epoch, ...pulled } = pullEntries(store, accountId, request);
  return { epoch, results, ...pulled };
}
