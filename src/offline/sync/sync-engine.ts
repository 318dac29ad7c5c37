/** Runs sync sessions one at a time, and tries again by itself after a failure. */
import { ApiError, NoNetworkError, StoreUnavailableError } from "../errors.ts";
import type { SyncStatus } from "../types.ts";
import { retryDelayMs } from "./retry-delay.ts";

export interface EngineParts {
  /** Sends and fetches everything, or throws. */
  runSession(): Promise<void>;
  report(phase: SyncStatus["phase"]): void;
  /** Calls back after a while; returns what calls it off. */
  schedule(callBack: () => void, delayMs: number): () => void;
  random(): number;
}

export interface SyncEngine {
  /** Syncs now, or once more after the session that is running. Resolves when done, well or not. */
  sync(): Promise<void>;
  /** Syncs unless a try is set for later already. */
  syncInTime(): void;
  stop(): void;
}

/** 409: the session is another account's. Both are cured by signing in, not by trying again. */
const isSignedOut = (error: unknown) =>
  error instanceof ApiError && (error.status === 401 || error.status === 409);

const retryAfterOf = (error: unknown): number | null =>
  error instanceof ApiError || error instanceof NoNetworkError ? error.retryAfterMs : null;

const isExpected = (error: unknown) =>
  error instanceof ApiError ||
  error instanceof NoNetworkError ||
  error instanceof StoreUnavailableError;

export function createSyncEngine(parts: EngineParts): SyncEngine {
  let running: Promise<void> | null = null;
  let again = false;
  let stopped = false;
  let failures = 0;
  /** The server asked to be left alone until the next try. */
  let held = false;
  let callOff: (() => void) | null = null;

  function tryLater(error: unknown): void {
    failures += 1;
    held = retryAfterOf(error) !== null;
    const delayMs = retryDelayMs(failures, parts.random(), retryAfterOf(error));
    callOff = parts.schedule(() => {
      callOff = null;
      held = false;
      void sync();
    }, delayMs);
  }

  function fail(error: unknown): void {
    if (!isExpected(error)) console.error(error);
    if (stopped) return;
    parts.report(isSignedOut(error) ? "signed-out" : "offline");
    if (!isSignedOut(error)) tryLater(error);
  }

  async function runOnce(): Promise<void> {
    callOff?.();
    callOff = null;
    again = false;
    parts.report("sending");
    try {
      await parts.runSession();
      failures = 0;
      if (!stopped) parts.report("idle");
    } catch (error) {
      fail(error);
    }
  }

  async function run(): Promise<void> {
    do await runOnce();
    while (again && !held && !stopped);
  }

  function sync(): Promise<void> {
    if (stopped || held) return Promise.resolve();
    if (running) again = true;
    running ??= run().finally(() => (running = null));
    return running;
  }

  return {
    sync,
    syncInTime: () => void (callOff ? undefined : sync()),
    stop() {
      stopped = true;
      callOff?.();
    },
  };
}
