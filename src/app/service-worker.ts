/** The app's own updates: found in the background, offered, and put in place when no form is open. */
import { useSyncExternalStore } from "react";
import type { Workbox } from "workbox-window";
import { onUpdatesHeldChange, updatesHeld, whenUpdatesFree } from "../offline/index.ts";

type Listener = () => void;
const listeners = new Set<Listener>();
let worker: Workbox | null = null;
let waiting = false;

function setWaiting(now: boolean): void {
  waiting = now;
  for (const listener of [...listeners]) listener();
}

/** A new version has taken over, perhaps at the word of another tab. */
function onTakenOver(): void {
  setWaiting(false);
  void whenUpdatesFree(() => window.location.reload());
}

/** The first version to take charge of a page is no new one. */
function watchController({ serviceWorker }: Navigator): void {
  let controlled = serviceWorker.controller !== null;
  serviceWorker.addEventListener("controllerchange", () => {
    if (controlled) onTakenOver();
    controlled = true;
  });
}

const checkWhenSeen = () => {
  if (document.visibilityState === "visible") void worker?.update().catch(() => undefined);
};

/** Call after the first paint. Until the service worker is in place, the app needs the network. */
export async function registerServiceWorker(): Promise<void> {
  if (worker || !import.meta.env.PROD || !("serviceWorker" in navigator)) return;
  const { Workbox } = await import("workbox-window");
  worker = new Workbox("/sw.js");
  worker.addEventListener("waiting", () => setWaiting(true));
  watchController(navigator);
  document.addEventListener("visibilitychange", checkWhenSeen);
  // With no network there is nothing to register, and nothing amiss.
  await worker.register().catch(() => undefined);
}

function subscribe(listener: Listener): () => void {
  listeners.add(listener);
  const unsubscribe = onUpdatesHeldChange(listener);
  return () => {
    listeners.delete(listener);
    unsubscribe();
  };
}

/** True where a new version waits and no form is open in this tab. */
export const useUpdateReady = (): boolean =>
  useSyncExternalStore(subscribe, () => waiting && !updatesHeld());

const HEED_MS = 2_000;

/** Puts the new version in place once no form is open in any tab; the page then loads anew. */
export async function applyUpdate(): Promise<void> {
  await whenUpdatesFree(() => worker?.messageSkipWaiting());
  // Chrome sits on it for half a minute if the old version was just waking up; said once more, it
  // moves at once.
  setTimeout(() => waiting && void applyUpdate(), HEED_MS);
}
