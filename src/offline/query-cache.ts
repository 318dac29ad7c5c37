/**
 * The persisted read cache: what the server last said of clubs, the Line-up and the like. It may
 * vanish at any moment with no loss; no entry ever depends on it.
 */
import { createSyncStoragePersister } from "@tanstack/query-sync-storage-persister";
import { QueryCache, QueryClient, type Query } from "@tanstack/react-query";
import type {
  PersistedClient,
  PersistQueryClientOptions,
} from "@tanstack/react-query-persist-client";
import { rememberedAccount } from "./account.ts";
import { ApiError } from "./errors.ts";

/**
 * A Line-up looked at before leaving must still be there after a week without a network. Each answer
 * has its own age: the cache as a whole is written anew all the time.
 */
const KEPT_MS = 14 * 24 * 60 * 60 * 1000;
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
function storageOf(accountId: string | null) {
  try {
    const storage = window.localStorage;
    return {
      getItem: (key: string) => storage.getItem(key),
      removeItem: (key: string) => storage.removeItem(key),
      /** Writes come a second late: by then the account may have been taken off this phone. */
      setItem(key: string, text: string) {
        if ((rememberedAccount()?.id ?? null) === accountId) storage.setItem(key, text);
      },
    };
  } catch {
    return null;
  }
}

const isYoung = ({ dataUpdatedAt }: { dataUpdatedAt: number }) =>
  Date.now() - dataUpdatedAt < KEPT_MS;

/** What was answered stays an answer, also where asking again has failed since. */
function serialize({ clientState, ...client }: PersistedClient): string {
  const queries = clientState.queries.map(({ state, ...query }) => ({
    ...query,
    state: { ...state, status: "success", error: null, fetchFailureReason: null },
  }));
  return JSON.stringify({ ...client, clientState: { ...clientState, queries } });
}

function deserialize(text: string): PersistedClient {
  const { clientState, ...client } = JSON.parse(text) as PersistedClient;
  const queries = clientState.queries.filter(({ state }) => isYoung(state));
  return { ...client, clientState: { ...clientState, queries } };
}

/** What this account may not see any more, it may not see as it was either. */
function forgetIfTakenAway(error: Error, query: Query<unknown, unknown>): void {
  const isTakenAway = error instanceof ApiError && (error.status === 404 || error.status === 403);
  if (isTakenAway && query.meta?.persist) query.setState({ data: undefined, dataUpdatedAt: 0 });
}

/**
 * A cache of its own for each account, in memory too, so that the next person on this phone sees
 * nothing of the last one's.
 */
export function createReadCache(accountId: string | null): ReadCache {
  return {
    client: new QueryClient({
      queryCache: new QueryCache({ onError: forgetIfTakenAway }),
      defaultOptions: { queries: { gcTime: KEPT_MS, retry: 1 } },
    }),
    persistOptions: {
      persister: createSyncStoragePersister({
        storage: storageOf(accountId),
        key: `sumpless-read-${accountId ?? "nobody"}`,
        serialize,
        deserialize,
      }),
      maxAge: KEPT_MS,
      buster: CACHE_VERSION,
      dehydrateOptions: {
        shouldDehydrateMutation: () => false,
        shouldDehydrateQuery: (query) =>
          query.meta?.persist === true && query.state.data !== undefined && isYoung(query.state),
      },
    },
  };
}
