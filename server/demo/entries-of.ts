import { subHours } from "date-fns";
import { v7 as uuid } from "uuid";
import type { Entry } from "../../shared/schemas/entry.ts";
import type { DemoBike, Told } from "./invented-club.ts";

const withoutTelling = ({ kind, hours, body }: Told) => ({ kind, hours, body });

/** A bike's entries as told, each strike right after what it strikes; and those the mechanic wrote. */
export function entriesOf({ patch, log }: DemoBike, bikeId: string, now: Date) {
  const at = (daysAgo: number) => subHours(now, daysAgo * 24).toISOString();
  const entryOf = (told: Told) =>
    ({ id: uuid(), bikeId, at: at(told.daysAgo), v: 1, ...withoutTelling(told) }) as Entry;
  const oldest = Math.max(...log.map((told) => told.daysAgo));
  const byOwner = [entryOf({ daysAgo: oldest + 1, kind: "bike", hours: null, body: patch })];
  const byMechanic: Entry[] = [];
  for (const told of log) {
    const entry = entryOf(told);
    const writer = told.byMechanic ? byMechanic : byOwner;
    writer.push(entry);
    if (!told.struck) continue;
    const body = { entryId: entry.id, reason: told.struck };
    writer.push(entryOf({ daysAgo: told.daysAgo - 0.1, kind: "strike", hours: null, body }));
  }
  return { byOwner, byMechanic };
}
