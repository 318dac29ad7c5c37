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

async function look(): Promise<StorageHealth> {
  if (typeof indexedDB === "undefined" || !navigator.storage?.persisted) return "unavailable";
  if (await navigator.storage.persisted()) return "persisted";
  return localStorage.getItem(ASKED) === null ? "unasked" : "refused";
}

/** What the browser promises at the moment. A browser that forbids storage throws on touch. */
export async function storageHealth(): Promise<StorageHealth> {
  return settle(await look().catch(() => "unavailable" as const));
}

/** After the first save: asks the browser, once, to keep what this phone holds. */
export async function askToKeepStorage(): Promise<void> {
  if ((await storageHealth()) !== "unasked") return;
  try {
    localStorage.setItem(ASKED, "yes");
  } catch {
    // No room to note it: asked at every save, the rider would be pestered.
    return;
  }
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
