import { useEffect } from "react";

type Listener = () => void;
const holders = new Set<symbol>();
const listeners = new Set<Listener>();

/** Keeps the page from being reloaded for a new version, until the returned function is called. */
export function holdUpdates(): () => void {
  const holder = Symbol("hold");
  holders.add(holder);
  return () => {
    if (holders.delete(holder) && holders.size === 0)
      for (const listener of [...listeners]) listener();
  };
}

export const updatesHeld = (): boolean => holders.size > 0;

/** Calls back each time the last hold is let go. */
export function onUpdatesReleased(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** For forms: while `open` is true, no new version takes the page away. */
export function useHoldUpdates(open = true): void {
  useEffect(() => (open ? holdUpdates() : undefined), [open]);
}
