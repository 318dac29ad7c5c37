/** What an account's tabs tell each other, and the parts of one tab. */
import type { SyncStatus } from "./types.ts";

/** Something in the logbook changed: read it again. */
export type LogbookTopic = "entries" | "drafts";

export type Announcement = { accountId: string } & (
  { about: LogbookTopic } | { about: "phase"; phase: SyncStatus["phase"] }
);

type Listener = (announcement: Announcement) => void;
const listeners = new Set<Listener>();
const channel =
  typeof BroadcastChannel === "undefined" ? null : new BroadcastChannel("sumpless-logbook");

const tell = (announcement: Announcement) => {
  for (const listener of [...listeners]) listener(announcement);
};

channel?.addEventListener("message", (event: MessageEvent<Announcement>) => tell(event.data));

export function announce(announcement: Announcement): void {
  tell(announcement);
  channel?.postMessage(announcement);
}

export function onAnnouncement(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
