import { onAccountChange, rememberedAccount } from "./account.ts";
import { reportPhase } from "./sync-status.ts";
import type { PageSync } from "./sync/page-sync.ts";
import type { Account } from "./types.ts";

let current: { accountId: string; sync: Promise<PageSync | null> } | null = null;

/** Lets the first paint go by. */
const idle = () =>
  new Promise<void>((resolve) => {
    if ("requestIdleCallback" in window) requestIdleCallback(() => resolve(), { timeout: 1_000 });
    else setTimeout(resolve, 200);
  });

async function load(account: Account): Promise<PageSync | null> {
  await idle();
  try {
    const { startPageSync } = await import("./sync/page-sync.ts");
    return startPageSync(account);
  } catch {
    // The chunk could not be had: nothing is sent until the next start.
    reportPhase(account.id, "offline");
    return null;
  }
}

function stop(): void {
  void current?.sync.then((sync) => sync?.stop());
  current = null;
}

/** Signing in again as the same account is a reason to sync; as another, to begin anew. */
function follow(): void {
  const account = rememberedAccount();
  if (account && current?.accountId === account.id) return requestSync();
  stop();
  if (account) current = { accountId: account.id, sync: load(account) };
}

/** Keeps this phone and the server in agreement for as long as the page is open. Returns what ends it. */
export function startSyncing(): () => void {
  follow();
  const unfollow = onAccountChange(follow);
  return () => {
    unfollow();
    stop();
  };
}

/** Syncs now; resolves when it is done, well or not: `useSyncStatus` says which. */
export async function syncNow(): Promise<void> {
  await (await current?.sync)?.sync();
}

export function requestSync(): void {
  void syncNow();
}
