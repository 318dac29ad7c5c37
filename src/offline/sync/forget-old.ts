import { KEPT_MS, shownClientOf } from "../query-cache.ts";

/**
 * Drops what the server said too long ago. Each answer has its own age: the cache as a whole is
 * written anew all the time.
 */
export async function forgetOld(accountId: string): Promise<void> {
  await shownClientOf(accountId)?.resetQueries({
    predicate: ({ meta, state }) =>
      meta?.persist === true &&
      state.data !== undefined &&
      Date.now() - state.dataUpdatedAt > KEPT_MS,
  });
}
