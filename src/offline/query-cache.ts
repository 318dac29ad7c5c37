/**
 * The persisted read cache: what the server last said of clubs, the Line-up and the like. It may
 * vanish at any moment with no loss; no entry ever depends on it.
 */
import { createSyncStoragePersister } from "@tanstack/query-sync-storage-persister";
import { QueryClient } from "@tanstack/react-query";
import type {
  PersistedClient,
  PersistQueryClientOptions,
} from "@tanstack/react-query-persist-client";
import { rememberedAccount } from "./account.ts";

/** A Line-up looked at before leaving must still be there after a week without a network. */
export const KEPT_MS = 14 * 24 * 60 * 60 * 1000;
/** Raise it when a cached answer's shape changes. */
const CACHE_VERSION = "2";

declare module "@tanstack/react-query" {
  interface Register {
    /** `persist: true` keeps the query's data for the next start. */
    queryMeta: { persist?: boolean };
  }
}

export interface ReadCache {
  client: QueryClient;
  persistOptions: Omit<PersistQueryClientOptions, "queryClient">;
}

/** localStorage throws on touch where the browser forbids it. */
function storage(): Storage | null {
  try {
    return window.localStorage;
  } catch {
    return null;
  }
}

/** What was answered stays an answer, also where asking again has failed since. */
function serialize({ clientState, ...client }: PersistedClient): string {
  const queries = clientState.queries.map(({ state, ...query }) => ({
    ...query,
    state: { ...state, status: "success", error: null, fetchFailureReason: null },
  }));
  return JSON.stringify({ ...client, clientState: { ...clientState, queries } });
}

/** What the screens of this page read from, and for which account. */
let shown: { accountId: string | null; client: QueryClient } | null = null;

/** For the sync, which is no part of the screens. */
export const shownClientOf = (accountId: string): QueryClient | null =>
  shown?.accountId === accountId ? shown.client : null;

/**
 * A cache of its own for each account, in memory too, so that the next person on this phone sees
 * nothing of the last one's.
 */
export function createReadCache(accountId: string | null): ReadCache {
  const client = new QueryClient({ defaultOptions: { queries: { gcTime: KEPT_MS, retry: 1 } } });
  const persister = createSyncStoragePersister({
    storage: storage(),
    key: `sumpless-read-${accountId ?? "nobody"}`,
    serialize(persisted) {
      // Writes come a second late: by then the account may have been taken off this phone.
      if ((rememberedAccount()?.id ?? null) !== accountId) throw new Error("Not here any more.");
      return serialize(persisted);
    },
  });
  return {
    client,
    persistOptions: {
      persister: {
        ...persister,
        restoreClient() {
          shown = { accountId, client };
          return persister.restoreClient();
        },
      },
      maxAge: KEPT_MS,
      buster: CACHE_VERSION,
      dehydrateOptions: {
        shouldDehydrateMutation: () => false,
        shouldDehydrateQuery: (query) =>
          query.meta?.persist === true && query.state.data !== undefined,
      },
    },
  };
}
