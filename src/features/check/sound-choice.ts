import { useSyncExternalStore } from "react";

const KEY = "sumpless-check-muted";
const listeners = new Set<() => void>();
let muted: boolean | null = null;

function read(): boolean {
  try {
    return localStorage.getItem(KEY) === "yes";
  } catch {
    return false;
  }
}

export const isMuted = () => (muted ??= read());

export function setMuted(next: boolean): void {
  muted = next;
  try {
    localStorage.setItem(KEY, next ? "yes" : "no");
  } catch {
    // It holds for this page.
  }
  for (const listener of [...listeners]) listener();
}

/** Whether the timer keeps quiet on this phone. */
export const useMuted = () =>
  useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => listeners.delete(listener);
  }, isMuted);
