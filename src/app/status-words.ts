import type { SyncStatus } from "../offline/index.ts";
import { formatSince } from "../ui/format-when.ts";

const phaseWords: Record<SyncStatus["phase"], string> = {
  idle: "",
  sending: "Sending",
  offline: "Offline",
  "signed-out": "Signed out",
};

/** The quiet line at the top: whether there is a network, how many entries wait, since when. */
export function statusWords(status: SyncStatus): string {
  const { phase, unsent, refused, oldestUnsentAt } = status;
  const waiting = unsent - refused;
  const since = oldestUnsentAt ? ` since ${formatSince(oldestUnsentAt)}` : "";
  const parts = [
    phaseWords[phase],
    waiting > 0 && `${waiting} ${waiting === 1 ? "entry waits" : "entries wait"}${since}`,
    refused > 0 && `${refused} not accepted`,
  ].filter(Boolean);
  if (parts.length > 0) return parts.join(" · ");
  return status.lastSyncAt ? `All sent, ${formatSince(status.lastSyncAt)}` : "";
}
