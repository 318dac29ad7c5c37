/**
 * Who this phone is used by. Kept in localStorage, read at once at start: the app opens offline and
 * with an expired session. Each account's logbook is a database of its own, which signing out
 * leaves on the phone, out of sight.
 */
import { useSyncExternalStore } from "react";
import type { Account } from "./types.ts";

const KEY = "sumpless-account";

type Listener = () => void;
const listeners = new Set<Listener>();
let remembered: { text: string | null; account: Account | null } = { text: null, account: null };

/** localStorage throws where the browser forbids it; the account then lasts as long as the page. */
function readText(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return remembered.text;
  }
}

function parseAccount(text: string | null): Account | null {
  try {
    const { id, name, email } = JSON.parse(text ?? "null") as Record<string, unknown>;
    const isAccount =
      typeof id === "string" && id !== "" && typeof name === "string" && typeof email === "string";
    return isAccount ? { id, name, email } : null;
  } catch {
    return null;
  }
}

/** The same object for as long as the account stays the same. */
export function rememberedAccount(): Account | null {
  const text = readText();
  if (text !== remembered.text) remembered = { text, account: parseAccount(text) };
  return remembered.account;
}

function tell(): void {
  for (const listener of [...listeners]) listener();
}

export function rememberAccount({ id, name, email }: Account): void {
  const account = { id, name, email };
  const text = JSON.stringify(account);
  remembered = { text, account };
  try {
    localStorage.setItem(KEY, text);
  } catch {
    // Remembered for this page only.
  }
  tell();
}

/** Signs the phone out. The account's logbook stays, for when it signs in again. */
export function forgetAccount(): void {
  remembered = { text: null, account: null };
  try {
    localStorage.removeItem(KEY);
  } catch {
    // Nothing was kept.
  }
  tell();
}

/** Calls back whenever the account changes, in this tab or another. */
export function onAccountChange(listener: Listener): () => void {
  const fromAnotherTab = (event: StorageEvent) => {
    if (event.key === KEY || event.key === null) listener();
  };
  listeners.add(listener);
  window.addEventListener("storage", fromAnotherTab);
  return () => {
    listeners.delete(listener);
    window.removeEventListener("storage", fromAnotherTab);
  };
}

export function useAccount(): Account | null {
  return useSyncExternalStore(onAccountChange, rememberedAccount);
}
