/** The one way by which an unsent entry leaves the phone. Not part of the first load. */
import { rememberedAccount } from "./account.ts";
import { announce } from "./announcements.ts";
import { isPassing } from "./logbook/refusals.ts";
import { discardRefused as discard } from "./logbook/discard-refused.ts";
import { phoneOf } from "./logbook/phone.ts";
import type { KeptEntry } from "./types.ts";

/** Where nothing else helps: it will never be accepted, or its bike is gone from this phone. */
export const mayDiscard = (kept: KeptEntry, bikeIsHere: boolean): boolean =>
  kept.state === "refused" && (!bikeIsHere || !isPassing(kept.reason));

/** Ask its writer first. */
export async function discardRefused(entryId: string): Promise<void> {
  const account = rememberedAccount();
  if (!account) return;
  await discard(phoneOf(account), entryId);
  announce({ accountId: account.id, about: "entries" });
}
