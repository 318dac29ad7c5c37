import { v7 as makeId } from "uuid";
import type { Summary } from "../../../shared/schemas/summary.ts";
import type { NewEntry } from "../types.ts";
import { summariseRows } from "./bike-row.ts";
import { checkRegistered, parseNewEntry } from "./parse-new-entry.ts";
import type { Phone } from "./phone.ts";

export async function previewSummary(
  phone: Phone,
  bikeId: string,
  newEntry: NewEntry,
): Promise<Summary> {
  const entry = parseNewEntry(newEntry, makeId());
  const database = await phone.open();
  const [bike, rows] = await Promise.all([
    database.get("bikes", bikeId),
    database.getAllFromIndex("entries", "bike", bikeId),
  ]);
  checkRegistered(entry, bike);
  const ownerId = bike?.ownerId ?? phone.account.id;
  return summariseRows(ownerId, [...rows, { entry, savedAt: entry.at }], phone.account);
}
