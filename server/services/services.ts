import type { SyncRequest } from "../../shared/schemas/sync.ts";
import { createAccounts, type AccountParts } from "./accounts.ts";
import { eraseBike } from "./erase.ts";
import { exportAccount } from "./export-account.ts";
import { bikeSummaryJson, ownSummariesJson } from "./read-bikes.ts";
import { syncLogbooks } from "./sync-logbooks.ts";

/** What the server does, for whoever asks: the routes, the demo. */
export function createServices(parts: AccountParts) {
  const { store } = parts;
  const accounts = createAccounts(parts);
  return {
    accounts,
    sync: (accountId: string, request: SyncRequest) => syncLogbooks(store, accountId, request),
    bikeSummaryJson: (accountId: string, bikeId: string) =>
      bikeSummaryJson(store, accountId, bikeId),
    ownSummariesJson: (accountId: string) => ownSummariesJson(store, accountId),
    eraseBike: (accountId: string, bikeId: string) => eraseBike(store, accountId, bikeId),
    exportAccount: (accountId: string) => exportAccount(store, accounts.find(accountId)),
    assertHealthy: () => store.ping(),
  };
}

export type Services = ReturnType<typeof createServices>;
