/** The form of a test day: the quick form with one syringe, and as many runs as that one needs. */
import { runsPerFill } from "../../../../shared/delivery/runs-per-fill.ts";
import { MAX_RUNS, type Syringe } from "../../../../shared/schemas/entry.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import type { RunDraft } from "../draft/check-draft-schema.ts";
import { planCheck, type CheckPlan } from "../draft/plan-check.ts";
import { addRun, beginQuick, type QuickDraft } from "../quick/quick-draft.ts";

export const STATION_FORM = "station-check";

/** How many runs a bike needs with the station's syringe, and what those read so far tell of it. */
export const planStation = (
  { summary, details }: BikeRecord,
  syringe: Syringe,
  readMl: number | null = null,
): CheckPlan => planCheck(summary, { ...details, atHours: summary.hours.now, readMl }, syringe);

/** All runs stand ready to be filled in, the barrel emptied wherever one more would not fit. */
export function beginStation(record: BikeRecord, syringe: Syringe, at: string): QuickDraft {
  const { now, displayOffset } = record.summary.hours;
  const { meter, meterFormat } = record.details;
  const { runs, expectedMl } = planStation(record, syringe);
  const inOneFill = expectedMl === null ? MAX_RUNS : runsPerFill(syringe.capacityMl, expectedMl);
  let draft = beginQuick({
    at,
    hoursText: now === null ? "" : formatHours(now - displayOffset, meterFormat),
    estimatedHours: meter === "estimated",
    syringe,
  });
  while (draft.runs.length < Math.min(runs ?? 1, MAX_RUNS))
    draft = addRun(draft, draft.runs.length % inOneFill === 0);
  return draft;
}

const isUntouched = ({ startText, endText }: RunDraft) => !startText && endText.trim() === "";

/** Runs that stood ready and were not done are no fault: a check may have fewer. */
export function withoutUntouched(draft: QuickDraft): QuickDraft {
  const last = draft.runs.findLastIndex((run) => !isUntouched(run));
  return { ...draft, runs: draft.runs.slice(0, Math.max(1, last + 1)) };
}
