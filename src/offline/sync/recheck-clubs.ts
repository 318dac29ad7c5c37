import type { Query, QueryClient } from "@tanstack/react-query";
import { NoNetworkError } from "../errors.ts";
import type { Phone } from "../logbook/phone.ts";
import { shownClientOf } from "../query-cache.ts";
import { clubsOnTestDay } from "../test-day.ts";
import { forgetWithdrawn } from "./forget-withdrawn.ts";

/** An empty list of clubs is nothing to be asked about again. */
const saysSomething = ({ state: { data } }: Query) => Object.keys(data ?? {}).length > 0;

async function keepsOfClubs(client: QueryClient, phone: Phone): Promise<boolean> {
  if (client.getQueryCache().findAll({ queryKey: ["clubs"], predicate: saysSomething }).length > 0)
    return true;
  return (await clubsOnTestDay(phone)).length > 0;
}

/**
 * The last part of a sync: what owners and organisers took back leaves this phone, also where it
 * only stood on a Line-up. Throws where there is no network; whatever else may be wrong with clubs
 * keeps no entry from being sent.
 */
export async function recheckClubs(phone: Phone, isCurrent: () => boolean): Promise<void> {
  const client = shownClientOf(phone.account.id);
  try {
    if (!client || !isCurrent() || !(await keepsOfClubs(client, phone))) return;
    await forgetWithdrawn({ client, phone, isCurrent });
  } catch (error) {
    if (error instanceof NoNetworkError && error.status === null) throw error;
  }
}
