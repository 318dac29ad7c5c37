/** The account's syringes: those added here, and those found in its own checks. */
import type { UseQueryResult } from "@tanstack/react-query";
import { rememberedAccount } from "./account.ts";
import { announce } from "./announcements.ts";
import { NotSavedError } from "./errors.ts";
import { useLogbookQuery } from "./logbook-query.ts";
import { phoneOf } from "./logbook/phone.ts";
import type { Syringe } from "./types.ts";

async function putSyringe(syringe: Syringe, retired: boolean): Promise<void> {
  const account = rememberedAccount();
  if (!account) throw new NotSavedError();
  const phone = phoneOf(account);
  const changedAt = phone.now().toISOString();
  const database = await phone.open();
  await database.put("syringes", { id: syringe.id, syringe, changedAt, retired });
  announce({ accountId: account.id, about: "entries" });
}

/** Adds a syringe, or changes the one with its id. Parse it with `syringeSchema` first. */
export const saveSyringe = (syringe: Syringe): Promise<void> => putSyringe(syringe, false);

/** Takes a syringe out of the list; the checks made with it keep it. */
export const retireSyringe = (syringe: Syringe): Promise<void> => putSyringe(syringe, true);

/** The syringes in use, the one used last first. */
export const useSyringes = (): UseQueryResult<Syringe[]> =>
  useLogbookQuery(["syringes"], async (database) => {
    const rows = (await database.getAll("syringes")).filter((row) => !row.retired);
    rows.sort((a, b) => Date.parse(b.changedAt) - Date.parse(a.changedAt));
    return rows.map((row) => row.syringe);
  });
