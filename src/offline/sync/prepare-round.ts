import type { SyncRequest } from "../../../shared/schemas/sync.ts";
import type { BikeRow, EntryRow } from "../logbook/database.ts";
import { withoutReceipt } from "../logbook/kept-entry.ts";
import type { Phone } from "../logbook/phone.ts";
import { isRefusedForGood } from "../logbook/refusals.ts";

/** One call's worth: what goes up, and what the phone says it has. */
export interface Round {
  account: string;
  epoch: string | undefined;
  known: Record<string, number>;
  entries: EntryRow["entry"][];
}

/** The server lists every own bike by itself; a shared one only where the phone asks for it. */
const isKnown = ({ access, rev }: BikeRow) => rev > 0 || access === "mechanic";

/** A bike's entries go with or after its registration. */
const registrationsFirst = (a: EntryRow, b: EntryRow) =>
  Number(b.entry.kind === "bike") - Number(a.entry.kind === "bike");

export async function prepareRound(
  phone: Phone,
  limit: number,
  answered: ReadonlySet<string>,
): Promise<Round> {
  const database = await phone.open();
  const [unsent, bikes, sync] = await Promise.all([
    database.getAllFromIndex("entries", "unsent"),
    database.getAll("bikes"),
    database.get("meta", "sync"),
  ]);
  const due = unsent.filter((row) => !isRefusedForGood(row) && !answered.has(row.entry.id));
  return {
    account: phone.account.id,
    epoch: sync?.epoch,
    known: Object.fromEntries(bikes.filter(isKnown).map(({ bikeId, rev }) => [bikeId, rev])),
    entries: due
      .sort(registrationsFirst)
      .slice(0, limit)
      .map(({ entry }) => withoutReceipt(entry)),
  } satisfies SyncRequest;
}
