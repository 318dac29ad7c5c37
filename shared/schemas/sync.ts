/** `POST /api/sync`: push and pull in one round. */
import { z } from "zod";
import { storedEntrySchema } from "./entry.ts";

export const MAX_PUSHED_ENTRIES = 500;
export const MAX_PULLED_ENTRIES = 2_000;

export const refusalReasons = [
  "invalid",
  "id-taken",
  "not-writable",
  "erased",
  "unknown-kind",
] as const;

export const syncRequestSchema = z.strictObject({
  /** The account the phone believes it is signed in to. */
  account: z.string().max(64).optional(),
  /** The database the phone last spoke to; another one answers after a restore. */
  epoch: z.string().max(64).optional(),
  /** The highest `rev` the phone has of each bike. */
  known: z.record(z.uuid("A bike's id is a UUID."), z.int().min(0)),
  entries: z
    .array(z.unknown(), "Entries come as a list.")
    .max(MAX_PUSHED_ENTRIES, `At most ${MAX_PUSHED_ENTRIES} entries a call.`),
});

export const syncResultSchema = z.object({
  index: z.int().min(0),
  /** The entry's id as it was sent; null where it had none. */
  id: z.string().nullable(),
  status: z.enum(["stored", "duplicate", "refused"]),
  reason: z.enum(refusalReasons).optional(),
  errors: z.record(z.string(), z.string()).optional(),
});

export const syncResponseSchema = z.object({
  epoch: z.string(),
  results: z.array(syncResultSchema),
  bikes: z.array(
    z.object({
      bikeId: z.string(),
      access: z.enum(["owner", "mechanic"]),
      rev: z.int().positive(),
      entries: z.array(storedEntrySchema),
    }),
  ),
  gone: z.array(z.string()),
  more: z.boolean(),
});

export type SyncRequest = z.infer<typeof syncRequestSchema>;
export type SyncResult = z.infer<typeof syncResultSchema>;
export type SyncResponse = z.infer<typeof syncResponseSchema>;
export type RefusalReason = (typeof refusalReasons)[number];
export type BikeAccess = SyncResponse["bikes"][number]["access"];
