/** Makes the record that the Shed reads, from a bike's log. */
import { bikeDetails } from "../../../shared/logbook/bike-details.ts";
import { lineUpFacts } from "../../../shared/logbook/line-up-facts.ts";
import { standingAdvice } from "../../../shared/logbook/standing-advice.ts";
import { standingEntries } from "../../../shared/logbook/standing-entries.ts";
import { summariseLogbook } from "../../../shared/logbook/summarise-logbook.ts";
import type { LogEntry } from "../../../shared/schemas/entry.ts";
import type { Summary } from "../../../shared/schemas/summary.ts";
import type { BikeAccess } from "../../../shared/schemas/sync.ts";
import type { Account } from "../types.ts";
import { BIKE_ROW_FORMAT, type BikeRow, type EntryRow } from "./database.ts";
import { readEntry } from "./kept-entry.ts";
import { isRefusedForGood, waitingRows } from "./refusals.ts";

/** This file's address holds a hash of the built code: another one means another judgement. */
export const BUILD = import.meta.url;

/** What the phone knows of a bike besides its log. */
export interface BikeStanding {
  bikeId: string;
  access: BikeAccess;
  rev: number;
}

const isRegistration = ({ entry }: EntryRow) => entry.kind === "bike";

/**
 * The rows that count, as the server counts them: not those it refused for good. A bike of which
 * nothing else is left keeps them all, so that it stays in sight with what was refused.
 */
function counted(rows: EntryRow[]): EntryRow[] {
  const standing = rows.filter((row) => !isRefusedForGood(row));
  return standing.some(isRegistration) ? standing : rows;
}

/** Who registered the bike: the author of the `bike` entry that the server stored first. */
function ownerOf(rows: EntryRow[], access: BikeAccess, account: Account): string {
  if (access === "owner") return account.id;
  const registrations = rows.filter(isRegistration).map(({ entry }) => entry);
  const first = registrations.sort((a, b) => (a.rev ?? Infinity) - (b.rev ?? Infinity))[0];
  return first?.author?.id ?? account.id;
}

const readable = (rows: EntryRow[], account: Account): LogEntry[] =>
  rows.flatMap((row) => readEntry(row, account) ?? []);

export function summariseRows(ownerId: string, rows: EntryRow[], account: Account): Summary {
  return summariseLogbook({ ownerId, entries: readable(counted(rows), account) });
}

export function makeBikeRow(standing: BikeStanding, rows: EntryRow[], account: Account): BikeRow {
  const ownerId = ownerOf(rows, standing.access, account);
  const logbook = { ownerId, entries: readable(counted(rows), account) };
  const { standing: heeded } = standingEntries(ownerId, logbook.entries);
  const summary = summariseLogbook(logbook);
  return {
    ...standing,
    ownerId,
    awaited: !rows.some(isRegistration),
    details: bikeDetails(heeded),
    summary,
    lineUp: lineUpFacts(logbook, summary),
    advice: standingAdvice(heeded),
    unsent: waitingRows(rows).length,
    format: BIKE_ROW_FORMAT,
    builtWith: BUILD,
  };
}
