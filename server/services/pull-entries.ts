import {
  MAX_PULLED_ENTRIES,
  type SyncRequest,
  type SyncResponse,
} from "../../shared/schemas/sync.ts";
import type { Store } from "../db/store.ts";
import { bikesToSend } from "./permissions.ts";

type Pull = Omit<SyncResponse, "results">;

/**
 * What the account's phone does not have yet, bike by bike, each ascending by `rev`; at most
 * `MAX_PULLED_ENTRIES` a call. A phone that last spoke to another life of the database has nothing
 * that can be counted on.
 */
export function pullEntries(
  store: Store,
  accountId: string,
  { known, epoch: lastEpoch }: SyncRequest,
): Pull {
  return store.read(() => {
    const epoch = store.epoch.current();
    const knownRev = (bikeId: string) =>
      lastEpoch !== undefined && lastEpoch !== epoch ? 0 : (known[bikeId] ?? 0);
    const pull: Pull = { epoch, bikes: [], gone: [], more: false };
    const visible = bikesToSend(store, accountId, Object.keys(known));
    let room = MAX_PULLED_ENTRIES;

    for (const { bikeId, access } of visible) {
      const found = store.entries.ofBike(bikeId, knownRev(bikeId), room + 1);
      const entries = found.slice(0, room);
      pull.more ||= found.length > entries.length;
      room -= entries.length;
      const last = entries.at(-1);
      if (last) pull.bikes.push({ bikeId, access, rev: last.rev, entries });
      if (pull.more) break;
    }
    const seen = new Set(visible.map(({ bikeId }) => bikeId));
    pull.gone = Object.keys(known).filter((bikeId) => !seen.has(bikeId));
    return pull;
  });
}
