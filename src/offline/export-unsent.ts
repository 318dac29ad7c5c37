import { rememberedAccount } from "./account.ts";
import { phoneOf } from "./logbook/phone.ts";

/**
 * The entries the server does not have, refused ones included, as a JSON file: for the rider to
 * keep, or to hand to whoever owns the bike.
 */
export async function exportUnsent(): Promise<Blob> {
  const account = rememberedAccount();
  const phone = account && phoneOf(account);
  const rows = phone ? await (await phone.open()).getAllFromIndex("entries", "unsent") : [];
  const file = {
    account,
    savedAt: new Date().toISOString(),
    entries: rows.map(({ entry, savedAt, refusal }) => ({ entry, savedAt, refusal })),
  };
  return new Blob([JSON.stringify(file, null, 2)], { type: "application/json" });
}
