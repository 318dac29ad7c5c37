import type { SyncRequest } from "../../shared/schemas/sync.ts";
import type { AccountParts } from "./account-parts.ts";
import { createAccounts } from "./accounts.ts";
import { createBikeShareService } from "./bike-shares.ts";
import { createClubInviteService } from "./club-invites.ts";
import { createClubMemberService } from "./club-members.ts";
import { createClubService } from "./clubs.ts";
import { mailAllDue } from "./due-mails.ts";
import { eraseBike } from "./erase.ts";
import { exportAccount } from "./export-account.ts";
import { checksCsv } from "./export-checks.ts";
import { createLineUp } from "./line-up.ts";
import { bikeSummaryJson, ownSummariesJson } from "./read-bikes.ts";
import { createReminderService } from "./reminders.ts";
import { completeSummaries } from "./summarise-bike.ts";
import { syncLogbooks } from "./sync-logbooks.ts";

/** What the server does, for whoever asks: the routes, the jobs, the demo. */
export function createServices(parts: AccountParts) {
  const { store } = parts;
  const accounts = createAccounts(parts);
  return {
    accounts,
    clubs: createClubService(store),
    clubMembers: createClubMemberService(store),
    clubInvites: createClubInviteService(parts),
    bikeShares: createBikeShareService(store),
    reminders: createReminderService(store),
    lineUp: createLineUp(store),
    sync: (accountId: string, request: SyncRequest) => syncLogbooks(parts, accountId, request),
    bikeSummaryJson: (accountId: string, bikeId: string) =>
      bikeSummaryJson(store, accountId, bikeId),
    ownSummariesJson: (accountId: string) => ownSummariesJson(store, accountId),
    eraseBike: (accountId: string, bikeId: string) => eraseBike(store, accountId, bikeId),
    exportAccount: (accountId: string) => exportAccount(parts, accounts.find(accountId)),
    checksCsv: (accountId: string) => checksCsv(store, accountId),
    mailAllDue: (now?: Date) => mailAllDue(parts, now),
    completeSummaries: () => completeSummaries(store),
    assertHealthy: () => store.ping(),
  };
}

export type Services = ReturnType<typeof createServices>;
