import type { Store } from "../db/store.ts";
import { notFound } from "../problems.ts";
import { accessTo } from "./permissions.ts";

/** One bike's summary as JSON, for whoever may read it. */
export function bikeSummaryJson(store: Store, accountId: string, bikeId: string): string {
  const json = accessTo(store, accountId, bikeId) && store.bikeSummaries.jsonOf(bikeId);
  if (!json) throw notFound();
  return json;
}

/** `{ bikes: [summary] }` of the account's own bikes, as JSON. */
export const ownSummariesJson = (store: Store, accountId: string) =>
  `{"bikes":[${store.bikeSummaries.jsonsOfOwner(accountId).join(",")}]}`;
