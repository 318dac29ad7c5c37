/** The sync of this page: one account, real network, real clock. */
import { syncResponseSchema } from "../../../shared/schemas/sync.ts";
import { rememberedAccount } from "../account.ts";
import { announce } from "../announcements.ts";
import { apiRequest } from "../api-client.ts";
import { phoneOf } from "../logbook/phone.ts";
import { rebuildBikes } from "../logbook/rebuild-bikes.ts";
import { reportPhase } from "../sync-status.ts";
import type { Account } from "../types.ts";
import { forgetOld } from "./forget-old.ts";
import { recheckClubs } from "./recheck-clubs.ts";
import { createSyncEngine, type SyncEngine } from "./sync-engine.ts";
import { runSyncSession, type SyncSession } from "./sync-session.ts";

const EVERY_MS = 3 * 60_000;

/** One tab sends at a time. Without Web Locks two may, which costs a call and does no harm. */
async function alone(name: string, work: () => Promise<void>): Promise<void> {
  if ("locks" in navigator) await navigator.locks.request(name, work);
  else await work();
}

function schedule(callBack: () => void, delayMs: number): () => void {
  const timer = setTimeout(callBack, delayMs);
  return () => clearTimeout(timer);
}

/** Syncs when the network comes back, when the page is looked at, and every few minutes. */
function syncOnOccasion(engine: SyncEngine): () => void {
  const onOnline = () => void engine.sync();
  const onVisible = () => {
    if (document.visibilityState === "visible") void engine.sync();
  };
  const timer = setInterval(() => engine.syncInTime(), EVERY_MS);
  window.addEventListener("online", onOnline);
  document.addEventListener("visibilitychange", onVisible);
  return () => {
    clearInterval(timer);
    window.removeEventListener("online", onOnline);
    document.removeEventListener("visibilitychange", onVisible);
  };
}

export type PageSync = Pick<SyncEngine, "sync" | "stop">;

export function startPageSync(account: Account): PageSync {
  let stopped = false;
  const phone = phoneOf(account);
  const tellChanged = () => announce({ accountId: account.id, about: "entries" });
  const session: SyncSession = {
    phone,
    send: (body) => apiRequest("/api/sync", { method: "POST", body, schema: syncResponseSchema }),
    isCurrent: () => !stopped && rememberedAccount()?.id === account.id,
    onApplied: tellChanged,
  };
  const engine = createSyncEngine({
    async runSession() {
      void forgetOld(account.id);
      await alone(`sumpless-sync-${account.id}`, () => runSyncSession(session));
      await recheckClubs(phone, () => session.isCurrent());
    },
    report: (phase) => reportPhase(account.id, phase),
    schedule,
    random: Math.random,
  });
  const stopOccasions = syncOnOccasion(engine);
  void rebuildBikes(phone)
    .then((rebuilt) => rebuilt && tellChanged())
    .catch(() => undefined)
    .then(() => engine.sync());
  return {
    sync: () => engine.sync(),
    stop() {
      stopped = true;
      stopOccasions();
      engine.stop();
    },
  };
}
