import { MAX_ENTRIES_PER_BIKE, type Entry } from "../../shared/schemas/entry.ts";
import type { BikeAccess, SyncResult } from "../../shared/schemas/sync.ts";
import type { Store } from "../db/store.ts";
import { isSameEntry } from "./is-same-entry.ts";
import { accessTo, mayStrike, mayWrite } from "./permissions.ts";
import { readPushedEntry, type Refusal } from "./read-pushed-entry.ts";
import { summariseBike, type SummarisedBike } from "./summarise-bike.ts";

type Outcome = "stored" | "duplicate" | Refusal;

const FULL = `This bike's log is full: at most ${MAX_ENTRIES_PER_BIKE.toLocaleString("en")} entries.`;
const NEVER_STRUCK = "The bike's own details and strikes cannot be struck.";
const ANOTHERS = "Only the bike's owner, or whoever wrote this entry, can strike it.";

/** One account's push, within a transaction. */
function createPush(store: Store, accountId: string, receivedAt: string) {
  const touched = new Set<string>();

  const registers = (entry: Entry) =>
    entry.kind === "bike" &&
    entry.body.name !== undefined &&
    store.bikes.ownerOf(entry.bikeId) === undefined;

  /** Why a strike cannot be, or null; one that comes before its target is judged by the logbook. */
  function strikeErrorOf(entry: Entry, access: BikeAccess): string | null {
    const target = entry.kind === "strike" ? store.entries.find(entry.body.entryId) : undefined;
    if (target?.bikeId !== entry.bikeId) return null;
    if (["bike", "strike"].includes(target.kind)) return NEVER_STRUCK;
    return mayStrike(access, accountId, target.authorId) ? null : ANOTHERS;
  }

  /** Why an entry that is new to the database is not stored, or null. */
  function refusalOf(entry: Entry): Refusal | null {
    const access = registers(entry) ? "owner" : accessTo(store, accountId, entry.bikeId);
    if (access === null || !mayWrite(access, entry.kind)) return { reason: "not-writable" };
    if (store.entries.find(entry.id)) return { reason: "id-taken" };
    const strikeError = strikeErrorOf(entry, access);
    if (strikeError) return { reason: "invalid", errors: { "body.entryId": strikeError } };
    if (store.entries.countOf(entry.bikeId) >= MAX_ENTRIES_PER_BIKE)
      return { reason: "invalid", errors: { bikeId: FULL } };
    return null;
  }

  function add(entry: Entry): Outcome {
    const { erasedIds, bikes, entries } = store;
    if (erasedIds.has(entry.bikeId) || erasedIds.has(entry.id)) return { reason: "erased" };
    const stored = entries.find(entry.id);
    if (stored && isSameEntry(stored, entry, accountId)) return "duplicate";
    const refusal = refusalOf(entry);
    if (refusal) return refusal;
    if (registers(entry)) bikes.add(entry.bikeId, accountId);
    entries.add({ ...entry, authorId: accountId, receivedAt });
    touched.add(entry.bikeId);
    return "stored";
  }

  return { add, registers, touched };
}

/**
 * Stores what an account's phone sent, each entry judged alone, and makes the summaries of the bikes
 * it touched anew: all in one transaction, `summarised` included. The answers are in the order of what
 * was sent.
 */
export function pushEntries(
  store: Store,
  accountId: string,
  sent: readonly unknown[],
  summarised: (bike: SummarisedBike) => void = () => undefined,
): SyncResult[] {
  if (sent.length === 0) return [];
  const pushed = sent.map((raw, index) => ({ index, ...readPushedEntry(raw) }));
  const answer = (index: number, id: string | null, outcome: Outcome): SyncResult =>
    typeof outcome === "string"
      ? { index, id, status: outcome }
      : { index, id, status: "refused", ...outcome };

  return store.write(() => {
    const push = createPush(store, accountId, new Date().toISOString());
    const outcomes = new Map<number, Outcome>();
    const readable = pushed.filter((one) => "entry" in one);
    // Bikes first, so that a call may hold a bike's entries in any order.
    const registrations = readable.filter(({ entry }) => push.registers(entry));
    const others = readable.filter((one) => !registrations.includes(one));
    for (const { index, entry } of [...registrations, ...others])
      outcomes.set(index, push.add(entry));
    for (const bikeId of push.touched) {
      const bike = summariseBike(store, bikeId);
      if (bike) summarised(bike);
    }
    return pushed.map((one) =>
      answer(one.index, one.id, "refusal" in one ? one.refusal : outcomes.get(one.index)!),
    );
  });
}
