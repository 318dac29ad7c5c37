import { rememberedAccount } from "./account.ts";
import { announce } from "./announcements.ts";
import { phoneOf } from "./logbook/phone.ts";
import { syncNow } from "./start-syncing.ts";

/**
 * Gets the logs of bikes shared with this account, for use with no network. They are *awaited*
 * until they are here; resolves once the server was asked, or could not be.
 */
export async function fetchBikes(bikeIds: readonly string[]): Promise<void> {
  const account = rememberedAccount();
  if (!account) return;
  const { awaitBikes } = await import("./logbook/await-bikes.ts");
  await awaitBikes(phoneOf(account), bikeIds);
  announce({ accountId: account.id, about: "entries" });
  await syncNow();
}
