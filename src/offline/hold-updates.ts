/**
 * A new version of the app reloads the page: never while a form is open, in this tab or another.
 * Each open form holds a shared lock; the update needs it exclusively.
 */
import { useEffect } from "react";

const LOCK = "sumpless-form-open";
type Listener = () => void;
const listeners = new Set<Listener>();
let holders = 0;

function count(change: 1 | -1): void {
  holders += change;
  for (const listener of [...listeners]) listener();
}

/** Other tabs see the lock; where there are no Web Locks, only this one knows. */
function lockUntil(released: Promise<void>): void {
  void navigator.locks?.request(LOCK, { mode: "shared" }, () => released);
}

/** Keeps updates away until the returned function is called. */
export function holdUpdates(): () => void {
  let release: () => void = () => undefined;
  const released = new Promise<void>((resolve) => (release = resolve)).then(() => count(-1));
  count(1);
  lockUntil(released);
  return release;
}

/** True while a form is open in this tab. */
export const updatesHeld = (): boolean => holders > 0;

export function onUpdatesHeldChange(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Runs `update` once no form is open in any tab. */
export async function whenUpdatesFree(update: () => Promise<void> | void): Promise<void> {
  if (navigator.locks) await navigator.locks.request(LOCK, update);
  else if (!updatesHeld()) await update();
}

/** For forms: while `open` is true, no new version takes the page away. */
export function useHoldUpdates(open = true): void {
  useEffect(() => (open ? holdUpdates() : undefined), [open]);
}
