/**
 * Who this phone is used by. Read at once at start, from localStorage: the app opens offline and
 * with an expired session. A lasting copy then has the last word. Each account's logbook is a
 * database of its own, which signing out leaves on the phone, out of sight.
 */
import { useSyncExternalStore } from "react";
import { readAccountCopy, writeAccountCopy } from "./account-copy.ts";
import type { Account } from "./types.ts";

const KEY = "sumpless-account";
/** Home-screen apps on iOS have been seen to hang on IndexedDB. */
const SETTLE_TIMEOUT_MS = 2_000;

type Listener = () => void;
const listeners = new Set<Listener>();
let remembered: { text: string | null; account: Account | null } = { text: null, account: null };
/** False where localStorage is forbidden or full: this page then remembers by itself. */
let isStored = true;

function readText(): string | null {
  try {
    return isStored ? localStorage.getItem(KEY) : remembered.text;
  } catch {
    return remembered.text;
  }
}

/** False where it could not be stored: not even an account from before may then stay there. */
function storeText(text: string | null): boolean {
  try {
    if (text === null) localStorage.removeItem(KEY);
    else localStorage.setItem(KEY, text);
    return true;
  } catch {
    if (text !== null) storeText(null);
    return false;
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

function adopt(text: string | null): void {
  remembered = { text, account: parseAccount(text) };
  isStored = storeText(text);
  tell();
}

/** The copy is written first: a tab opened meanwhile must not find the last account there. */
function change(text: string | null): void {
  writeAccountCopy(text).catch(() => undefined);
  adopt(text);
}

export const rememberAccount = ({ id, name, email }: Account): void =>
  change(JSON.stringify({ id, name, email }));

/** Signs the phone out. The account's logbook stays, for when it signs in again. */
export const forgetAccount = (): void => change(null);

/** What the copy says counts, unless the account was changed while it was being read. */
async function heedCopy(): Promise<void> {
  const before = readText();
  const copy = await readAccountCopy();
  if (readText() !== before || copy === before) return;
  if (copy !== undefined) adopt(copy);
  else if (before !== null) await writeAccountCopy(before);
}

let settled: Promise<void> | null = null;

/** Resolves once it is certain whether this phone has an account: ask before sending to sign in. */
export const settleAccount = (): Promise<void> =>
  (settled ??= Promise.race([
    heedCopy().catch(() => undefined),
    new Promise<void>((resolve) => setTimeout(resolve, SETTLE_TIMEOUT_MS)),
  ]));

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
