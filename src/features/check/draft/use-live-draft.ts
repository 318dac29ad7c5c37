import { useCallback, useSyncExternalStore } from "react";
import { dropDraft, keepDraft, useAccount, useDraft } from "../../../offline/index.ts";

/** What was typed but is not yet read back from the phone's store, so that no keystroke waits for it. */
interface Unsettled {
  content: unknown;
  /** Infinity while it is being written. */
  writtenAt: number;
  failed: boolean;
}

/** A store that takes longer hangs; saving the entry will find that out too. */
const LONGEST_WRITE_MS = 1_000;

const unsettled = new Map<string, Unsettled>();
const listeners = new Set<() => void>();
/** Writes go one after another: the last typed is the last written. */
let writing: Promise<unknown> = Promise.resolve();

function subscribe(listener: () => void) {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function put(key: string, value: Unsettled) {
  unsettled.set(key, value);
  for (const listener of [...listeners]) listener();
}

function write(key: string, bikeId: string, form: string, content: unknown) {
  const typed: Unsettled = { content, writtenAt: Infinity, failed: false };
  put(key, typed);
  const finish = (outcome: Pick<Unsettled, "writtenAt" | "failed">) => {
    if (unsettled.get(key) === typed) put(key, { ...typed, ...outcome });
  };
  writing = writing
    .then(() => (content === null ? dropDraft(bikeId, form) : keepDraft(bikeId, form, content)))
    .then(
      () => finish({ writtenAt: Date.now(), failed: false }),
      () => finish({ writtenAt: Infinity, failed: true }),
    );
}

export interface LiveDraft<T> {
  /** False until the phone's store has answered. */
  ready: boolean;
  /** As stored, whatever it is; null where there is none. */
  stored: unknown;
  /** Null where there is none, or none that this version of the app can read. */
  draft: T | null;
  /** True where this phone does not keep what is typed until it is saved. */
  unkept: boolean;
  /** Replaces the draft at once, and in the store as soon as may be; null drops it. */
  set: (content: unknown) => void;
  /** Changes the draft as it now stands; where there is none, `first` is what is changed, if given. */
  change: (edit: (draft: T) => T, first?: T) => void;
  /** To be called when the entry is saved, and the draft gone with it. */
  forget: () => void;
}

interface Shape<T> {
  safeParse: (content: unknown) => { success: true; data: T } | { success: false };
}

/**
 * The draft of a form, kept in the phone's store at every change. Each step of a check is a page of
 * its own, so what was just typed has to outlive the page.
 */
export function useLiveDraft<T>(bikeId: string, form: string, shape: Shape<T>): LiveDraft<T> {
  const accountId = useAccount()?.id ?? "";
  const key = `${accountId}/${bikeId}/${form}`;
  const query = useDraft(bikeId, form);
  const typed = useSyncExternalStore(subscribe, () => unsettled.get(key));
  const settled = !typed || query.dataUpdatedAt > typed.writtenAt;
  const stored = settled ? (query.data?.content ?? null) : typed.content;

  const set = useCallback(
    (content: unknown) => write(key, bikeId, form, content),
    [key, bikeId, form],
  );
  const parsed = shape.safeParse(stored);
  const change = (edit: (draft: T) => T, first?: T) => {
    // Two changes may come before the page is drawn again: the second builds on the first.
    const newer = unsettled.get(key);
    const latest = shape.safeParse(newer === typed ? stored : newer?.content);
    const draft = latest.success ? latest.data : first;
    if (draft) set(edit(draft));
  };
  return {
    ready: !settled || query.isSuccess || query.isError,
    stored,
    draft: parsed.success ? parsed.data : null,
    unkept: (typed?.failed ?? false) || query.isError,
    set,
    change,
    forget: () => unsettled.delete(key),
  };
}

/** Resolves when everything typed so far is written, or cannot be: an entry is saved after it. */
export const draftsWritten = (): Promise<unknown> =>
  Promise.race([writing, new Promise((resolve) => setTimeout(resolve, LONGEST_WRITE_MS))]);
