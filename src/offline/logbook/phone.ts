import type { Account } from "../types.ts";
import { connectTo } from "./connection.ts";
import type { LogbookDatabase } from "./database.ts";

/** What the logbook's code knows of the phone it runs on. */
export interface Phone {
  account: Account;
  databaseName: string;
  open(): Promise<LogbookDatabase>;
  now(): Date;
}

export const databaseNameOf = (accountId: string) => `sumpless-logbook-${accountId}`;

export function phoneOf(account: Account): Phone {
  const databaseName = databaseNameOf(account.id);
  return { account, databaseName, open: () => connectTo(databaseName), now: () => new Date() };
}
