import { ENTRY_VERSION, entrySchema, type Entry } from "../../../shared/schemas/entry.ts";
import { errorsByField } from "../../../shared/schemas/errors-by-field.ts";
import { InvalidEntryError } from "../errors.ts";
import type { NewEntry } from "../types.ts";
import type { BikeRow } from "./database.ts";

export function parseNewEntry(entry: NewEntry, id: string): Entry {
  const parsed = entrySchema.safeParse({ ...entry, id, v: ENTRY_VERSION });
  if (!parsed.success) throw new InvalidEntryError(errorsByField(parsed.error));
  return parsed.data;
}

/** A bike's first entry registers it, and must name it. */
export function checkRegistered(entry: Entry, bike: BikeRow | undefined): void {
  if (bike) return;
  if (entry.kind !== "bike") throw new InvalidEntryError({ bikeId: "This bike is not here." });
  if (entry.body.name === undefined)
    throw new InvalidEntryError({ "body.name": "Give the bike a name." });
}
