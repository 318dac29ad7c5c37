import type {
  Action,
  BikePatch,
  CheckBody,
  EntryBody,
  LogEntry,
  WorkItem,
} from "../../shared/schemas/entry.ts";

const BIKE = "0190a000-0000-7000-8000-000000000001";
const DAY_MS = 86_400_000;
export const syringe5 = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };

/**
 * A logbook for tests, a line an entry. Each entry is a day after the one before unless told
 * otherwise (an hour reading 30 h later 30 days after), written by the owner and received at once.
 */
export function logbook(start = "2026-03-01T09:00:00.000Z") {
  const entries: LogEntry[] = [];
  let timeMs = Date.parse(start);
  const add = (kind: string, hours: number | null, body: object, at?: string) => {
    if (at) timeMs = Date.parse(at);
    const count = entries.length + 1;
    const instant = new Date(timeMs).toISOString();
    timeMs += 10 * DAY_MS;
    entries.push({
      id: `0190a000-0000-7000-9000-${String(count).padStart(12, "0")}`,
      bikeId: BIKE,
      v: 1,
      kind,
      at: instant,
      hours,
      body,
      author: { id: "owner", name: "Owner" },
      receivedAt: instant,
      rev: count,
    } as LogEntry);
    return book;
  };
  const book = {
    entries,
    /** The id of the last entry. */
    get lastId() {
      return entries.at(-1)!.id;
    },
    bike: (patch: BikePatch, hours: number | null = null, at?: string) =>
      add("bike", hours, patch, at),
    hours: (hours: number, body: EntryBody<"hours"> = {}, at?: string) =>
      add("hours", hours, body, at),
    /** One fill a run, each read from 0. */
    check: (hours: number, endMl: number[], more: Partial<CheckBody> = {}, at?: string) =>
      add(
        "check",
        hours,
        {
          syringe: syringe5,
          runs: endMl.map((end) => ({ startMl: 0, endMl: end })),
          closedOut: true,
          ...more,
        },
        at,
      ),
    work: (hours: number, items: WorkItem[], startsSeries: boolean, at?: string) =>
      add("work", hours, { items, startsSeries }, at),
    meter: (oldHours: number | null, newReading: number, at?: string) =>
      add("meter", oldHours, { newReading }, at),
    note: (text: string, advice?: Action) => add("note", null, { text, ...(advice && { advice }) }),
    strike: (entryId: string, reason = "Wrong bike") => add("strike", null, { entryId, reason }),
  };
  return book;
}
