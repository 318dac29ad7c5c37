/**
 * The phone's store, outbox and sync. This file and what it imports at once is in the first load:
 * the schemas, the judging and the sync itself come after, by dynamic import.
 */
export type * from "./types.ts";
export * from "./errors.ts";
export {
  forgetAccount,
  rememberAccount,
  rememberedAccount,
  settleAccount,
  useAccount,
} from "./account.ts";
export { apiFile, apiRequest } from "./api-client.ts";
export { dropDraft, keepDraft, useDraft, useDrafts } from "./drafts.ts";
export { eraseFromPhone } from "./erase-from-phone.ts";
export { exportUnsent } from "./export-unsent.ts";
export { fetchBikes } from "./fetch-bikes.ts";
export {
  holdUpdates,
  onUpdatesHeldChange,
  updatesHeld,
  useHoldUpdates,
  whenUpdatesFree,
} from "./hold-updates.ts";
export { useBike, useBikes, useUnsent } from "./logbook-queries.ts";
export { CHECK_FORM, isHoseMaybeOff, useOpenChecks, type OpenCheck } from "./open-checks.ts";
export { isPassing } from "./logbook/refusals.ts";
export { createReadCache, type ReadCache } from "./query-cache.ts";
export { previewSummary, saveEntry, type SaveOptions } from "./save-entry.ts";
export { storageHealth, useStorageHealth } from "./storage-health.ts";
export { startSyncing, syncNow } from "./start-syncing.ts";
export { useSyncStatus } from "./sync-status.ts";
export { retireSyringe, saveSyringe, useSyringes } from "./syringes.ts";
