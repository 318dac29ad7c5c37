import { ENTRY_VERSION, entryKinds, entrySchema, type Entry } from "../../shared/schemas/entry.ts";
import { errorsByField } from "../../shared/schemas/errors-by-field.ts";
import type { RefusalReason } from "../../shared/schemas/sync.ts";

export interface Refusal {
  reason: RefusalReason;
  errors?: Record<string, string>;
}

/** What one element of a push turned out to be. */
export type PushedEntry = { id: string | null } & ({ entry: Entry } | { refusal: Refusal });

/** Of a kind or version that a newer app writes: to be sent again once this server knows it too. */
function isFromNewerApp({ kind, v }: { kind?: unknown; v?: unknown }): boolean {
  const unknownKind = typeof kind === "string" && !(entryKinds as string[]).includes(kind);
  return unknownKind || (Number.isInteger(v) && (v as number) > ENTRY_VERSION);
}

/**
 * Judges one element by itself, without the database. An entry is kept as it was sent, not as the
 * schema hands it back: the phone's copy and the server's are the same to the letter.
 */
export function readPushedEntry(raw: unknown): PushedEntry {
  const sent = (typeof raw === "object" && raw !== null ? raw : {}) as Record<string, unknown>;
  const id = typeof sent.id === "string" ? sent.id : null;
  if (id !== null && isFromNewerApp(sent)) return { id, refusal: { reason: "unknown-kind" } };
  const parsed = entrySchema.safeParse(raw);
  if (parsed.success) return { id, entry: raw as Entry };
  return { id, refusal: { reason: "invalid", errors: errorsByField(parsed.error) } };
}
