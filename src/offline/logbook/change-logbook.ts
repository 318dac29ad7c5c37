import type { LogbookChange } from "./database.ts";
import type { Phone } from "./phone.ts";

/** Undoes what can still be undone; a transaction that has finished cannot be. */
function abort(change: LogbookChange): void {
  try {
    change.abort();
  } catch {
    // Finished or aborted already.
  }
}

/**
 * Runs `work` in one transaction over the whole logbook and resolves once that has completed on
 * disk. If `work` throws or `signal` aborts, nothing of it stays: without this, IndexedDB would
 * commit the half that was done.
 */
export async function changeLogbook<T>(
  phone: Phone,
  work: (change: LogbookChange) => Promise<T>,
  signal?: AbortSignal,
): Promise<T> {
  const database = await phone.open();
  signal?.throwIfAborted();
  const change = database.transaction(
    ["entries", "bikes", "syringes", "drafts", "meta"],
    "readwrite",
    { durability: "strict" },
  );
  const giveUp = () => abort(change);
  signal?.addEventListener("abort", giveUp);
  try {
    const [result] = await Promise.all([work(change), change.done]);
    return result;
  } catch (error) {
    giveUp();
    throw error;
  } finally {
    signal?.removeEventListener("abort", giveUp);
  }
}
