import type { Account } from "../types.ts";
import type { EntryRow, LogbookChange } from "./database.ts";
import { isMine, readEntry } from "./kept-entry.ts";

/** Keeps the syringe of one's own check at hand, unless something later is known of it. */
export async function rememberSyringe(
  change: LogbookChange,
  row: EntryRow,
  account: Account,
): Promise<void> {
  const check = row.entry.kind === "check" && isMine(row, account) && readEntry(row, account);
  if (!check || check.kind !== "check" || !check.body.syringe) return;
  const syringe = check.body.syringe;
  const syringes = change.objectStore("syringes");
  const known = await syringes.get(syringe.id);
  if (known && Date.parse(known.changedAt) >= Date.parse(check.at)) return;
  await syringes.put({ id: syringe.id, syringe, changedAt: check.at, retired: false });
}
