import { useSyncExternalStore } from "react";
import type { StorageHealth } from "./types.ts";

const ASKED = "sumpless-storage-asked";
type Listener = () => void;
const listeners = new Set<Listener>();
let health: StorageHealth = "unasked";

function settle(next: StorageHealth): StorageHealth {
  health = next;
  for (const listener of [...listeners]) listener();
  return health;
}

/** What the browser promises at the moment. */
export async function storageHealth(): Promise<StorageHealth> {
  if (typeof indexedDB === "undefined" || !navigator.storage?.persisted)
    return settle("unavailable");
  if (await navigator.storage.persisted()) return settle("persisted");
  return settle(localStorage.getItem(ASKED) === null ? "unasked" : "refused");
}

/** After the first save: asks the browser, once, to keep what this phone holds. */
export async function askToKeepStorage(): Promise<void> {
  if ((await storageHealth()) !== "unasked") return;
  localStorage.setItem(ASKED, "yes");
  settle((await navigator.storage.persist()) ? "persisted" : "refused");
}

function subscribe(listener: Listener): () => void {
  listeners.add(listener);
  if (listeners.size === 1) void storageHealth();
  return () => listeners.delete(listener);
}

export function useStorageHealth(): StorageHealth {
  return useSyncExternalStore(subscribe, () => health);
}
