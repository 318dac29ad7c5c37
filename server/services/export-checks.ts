import { stringify } from "csv-stringify/sync";
import { standingEntries } from "../../shared/logbook/standing-entries.ts";
import type { LogEntry, LogEntryOf, Run } from "../../shared/schemas/entry.ts";
import { summarySchema, type CheckSummary } from "../../shared/schemas/summary.ts";
import type { Store } from "../db/store.ts";

type Check = LogEntryOf<"check">;

interface Row {
  bike: string;
  check: Check;
  struck: boolean;
  /** Missing where the check does not count. */
  judged: CheckSummary | undefined;
}

const runInWords = (run: Run) =>
  ("endMl" in run ? `${run.startMl} to ${run.endMl}` : `${run.deliveredMl}`) +
  (run.void ? " (void)" : "");

/** To four decimals: finer than anything that was read. */
const rounded = (value: number | null | undefined) =>
  typeof value === "number" ? Number(value.toFixed(4)) : null;

const columns: Record<string, (row: Row) => string | number | null | undefined> = {
  Bike: ({ bike }) => bike,
  "Checked at": ({ check }) => check.at,
  "Meter, h": ({ check }) => check.hours,
  "Engine hours": ({ judged }) => rounded(judged?.atHours),
  "Delivery, mL a run": ({ judged }) => rounded(judged?.perRunMl),
  "Standard uncertainty, mL": ({ judged }) => rounded(judged?.uMl),
  "Part of baseline": ({ judged }) => rounded(judged?.ratio),
  "Standard uncertainty of part": ({ judged }) => rounded(judged?.uRatio),
  Delivery: ({ judged }) => judged?.verdict,
  Action: ({ judged }) => judged?.action,
  "Probability of low": ({ judged }) => rounded(judged?.pLow),
  Counts: ({ judged, struck }) => (struck ? "struck" : judged ? "yes" : "no"),
  "Runs, mL": ({ check }) => check.body.runs.map(runInWords).join("; "),
  Syringe: ({ check }) => check.body.syringe?.label,
  "Marks, mL": ({ check }) => check.body.syringe?.graduationMl,
  "Oil, °C": ({ check }) => check.body.oilTempC,
  Spoilers: ({ check }) => check.body.spoilers?.join("; "),
  "Closed out": ({ check }) => (check.body.closedOut ? "yes" : "no"),
  "Written by": ({ check }) => check.author?.name,
  Note: ({ check }) => check.body.note,
};

function rowsOf(store: Store, ownerId: string, bikeId: string): Row[] {
  const summary = summarySchema.parse(JSON.parse(store.bikeSummaries.jsonOf(bikeId) ?? "null"));
  // Parsed when they were stored; what only a newer server knows is no check of this one.
  const entries = store.entries.ofBike(bikeId) as unknown as LogEntry[];
  const { struck } = standingEntries(ownerId, entries);
  return entries
    .filter((entry): entry is Check => entry.kind === "check" && entry.v === 1)
    .sort((a, b) => Date.parse(a.at) - Date.parse(b.at))
    .map((check) => ({
      bike: summary.name,
      check,
      struck: struck.has(check.id),
      judged: summary.checks.find(({ entryId }) => entryId === check.id),
    }));
}

/**
 * Every delivery check of the account's own bikes as CSV (RFC 4180), for a spreadsheet, which must
 * take no note for a formula.
 */
export function checksCsv(store: Store, accountId: string): string {
  const rows = store.read(() =>
    store.bikes.idsOf(accountId).flatMap((bikeId) => rowsOf(store, accountId, bikeId)),
  );
  const records = rows.map((row) => Object.values(columns).map((cell) => cell(row)));
  return stringify(records, {
    header: true,
    columns: Object.keys(columns),
    bom: true,
    escape_formulas: true,
    record_delimiter: "windows",
  });
}
