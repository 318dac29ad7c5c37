import { v7 as uuid } from "uuid";
import type { Action, EntryBody, EntryKind, WorkItem } from "../../shared/schemas/entry.ts";

export const newId = () => uuid();

/** An entry as a phone makes it. */
const make = <K extends EntryKind>(
  bikeId: string,
  kind: K,
  hours: number | null,
  body: EntryBody<K>,
  at = "2026-03-01T09:00:00.000Z",
) => ({ id: newId(), bikeId, kind, v: 1, at, hours, body });

export const bikeEntry = (bikeId: string, body: EntryBody<"bike"> = { name: "Moss" }) =>
  make(bikeId, "bike", null, body);
export const hoursEntry = (bikeId: string, hours: number, at?: string) =>
  make(bikeId, "hours", hours, {}, at);
export const noteEntry = (bikeId: string, text = "Chain oiled", advice?: Action) =>
  make(bikeId, "note", null, { text, ...(advice && { advice }) });
export const workEntry = (bikeId: string, hours: number, items: WorkItem[]) =>
  make(bikeId, "work", hours, { items, startsSeries: false });
export const meterEntry = (bikeId: string, hours: number, newReading: number) =>
  make(bikeId, "meter", hours, { newReading });
export const topupEntry = (bikeId: string, oilMl: number) => make(bikeId, "topup", null, { oilMl });
export const strikeEntry = (bikeId: string, entryId: string) =>
  make(bikeId, "strike", null, { entryId, reason: "Wrong bike" });

/** One run from 0 in a 5 mL barrel with 0.2 mL marks. */
export const checkEntry = (bikeId: string, hours: number, endMl: number, at?: string) =>
  make(
    bikeId,
    "check",
    hours,
    {
      syringe: { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 },
      runs: [{ startMl: 0, endMl }],
      closedOut: true,
    },
    at,
  );

/** A bike's log: registered, a baseline at 12.0 h, a second check at 32.0 h of `endMl`. */
export const smallLog = (bikeId: string, endMl = 2.5) => [
  bikeEntry(bikeId),
  checkEntry(bikeId, 12, 3, "2026-03-02T09:00:00.000Z"),
  noteEntry(bikeId),
  checkEntry(bikeId, 32, endMl, "2026-04-02T09:00:00.000Z"),
  hoursEntry(bikeId, 33, "2026-04-09T09:00:00.000Z"),
];
