import { useSyncExternalStore } from "react";
import { useAccount } from "./account.ts";
import { announce, onAnnouncement } from "./announcements.ts";
import { useLogbookQuery } from "./logbook-query.ts";
import type { LogbookDatabase } from "./logbook/database.ts";
import { readWaiting } from "./logbook/refusals.ts";
import type { SyncStatus } from "./types.ts";

type Phase = SyncStatus["phase"];
type Counts = Omit<SyncStatus, "phase">;

const phases = new Map<string, Phase>();
onAnnouncement((told) => {
  if (told.about === "phase") phases.set(told.accountId, told.phase);
});

const phaseOf = (accountId: string | undefined): Phase =>
  phases.get(accountId ?? "") ?? (navigator.onLine ? "idle" : "offline");

/** Where an account's sync stands, told to every tab. */
export const reportPhase = (accountId: string, phase: Phase): void =>
  announce({ accountId, about: "phase", phase });

async function readCounts(database: LogbookDatabase): Promise<Counts> {
  const [waiting, sync] = await Promise.all([readWaiting(database), database.get("meta", "sync")]);
  return {
    unsent: waiting.length,
    refused: waiting.filter((row) => row.refusal).length,
    oldestUnsentAt: waiting[0]?.unsentSince ?? null,
    lastSyncAt: sync?.lastSyncAt ?? null,
  };
}

const nothingKnown: Counts = { unsent: 0, refused: 0, oldestUnsentAt: null, lastSyncAt: null };

export function useSyncStatus(): SyncStatus {
  const accountId = useAccount()?.id;
  const phase = useSyncExternalStore(onAnnouncement, () => phaseOf(accountId));
  const counts = useLogbookQuery(["status"], readCounts).data ?? nothingKnown;
  return { phase, ...counts };
}
