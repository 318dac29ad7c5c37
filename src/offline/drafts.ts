/** Forms half filled in: they outlive a reload, a phone call and a flat battery. */
import type { UseQueryResult } from "@tanstack/react-query";
import { rememberedAccount } from "./account.ts";
import { announce } from "./announcements.ts";
import { useLogbookQuery } from "./logbook-query.ts";
import { phoneOf, type Phone } from "./logbook/phone.ts";
import type { LogbookDatabase } from "./logbook/database.ts";
import type { Draft } from "./types.ts";

async function change(
  write: (database: LogbookDatabase, phone: Phone) => Promise<unknown>,
): Promise<void> {
  const account = rememberedAccount();
  if (!account) return;
  const phone = phoneOf(account);
  await write(await phone.open(), phone);
  announce({ accountId: account.id, about: "drafts" });
}

export const keepDraft = (bikeId: string, form: string, content: unknown): Promise<void> =>
  change((database, phone) =>
    database.put("drafts", { bikeId, form, content, savedAt: phone.now().toISOString() }),
  );

export const dropDraft = (bikeId: string, form: string): Promise<void> =>
  change((database) => database.delete("drafts", [bikeId, form]));

/** Changes a draft as it stands in the store, in one step: two changes at once are both kept. */
export const changeDraft = (
  bikeId: string,
  form: string,
  edit: (content: unknown) => unknown,
): Promise<void> =>
  change(async (database, phone) => {
    const { store, done } = database.transaction("drafts", "readwrite", { durability: "strict" });
    const content = edit((await store.get([bikeId, form]))?.content);
    await store.put({ bikeId, form, content, savedAt: phone.now().toISOString() });
    await done;
  });

/** The draft of one form on one bike; null where there is none. */
export const useDraft = (bikeId: string, form: string): UseQueryResult<Draft | null> =>
  useLogbookQuery(
    ["draft", bikeId, form],
    async (database) => (await database.get("drafts", [bikeId, form])) ?? null,
    "drafts",
  );

/** All drafts, for the Shed to point at what was left half done. */
export const useDrafts = (): UseQueryResult<Draft[]> =>
  useLogbookQuery(["drafts"], (database) => database.getAll("drafts"), "drafts");
