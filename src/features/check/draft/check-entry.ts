import type { CheckBody, Run, Sequence } from "../../../../shared/schemas/entry.ts";
import type { NewEntry } from "../../../offline/index.ts";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { parseHours } from "../../../ui/parse-hours.ts";
import { isClosedOut, isOver, startTextOf } from "./check-draft.ts";
import type { CheckDraft, RunDraft, VoidReason } from "./check-draft-schema.ts";

export type CheckEntry = Extract<NewEntry, { kind: "check" }>;

/** As a sentence goes on after "Run 2 is void:". */
export const voidWords: Record<VoidReason, string> = {
  "not-started": "it did not start",
  interrupted: "it was interrupted",
  doubled: "it ran twice",
};

function runSeconds(run: RunDraft, sequence: Sequence | null): number | undefined {
  if (run.voided === "not-started") return undefined;
  return run.seconds ?? (run.startedAt && sequence ? sequence.seconds : undefined);
}

function asRun(draft: CheckDraft, n: number, run: RunDraft, sequence: Sequence | null): Run {
  const seconds = runSeconds(run, sequence);
  const startMl = parseDecimal(startTextOf(draft, n, null)) ?? 0;
  const endMl = parseDecimal(run.endText);
  const observed = {
    ...(seconds === undefined ? {} : { seconds }),
    ...(run.rhythm ? { rhythm: run.rhythm } : {}),
  };
  // A void run's levels say nothing; they are kept where they were read.
  if (run.voided)
    return { startMl, endMl: Math.max(startMl, endMl ?? startMl), ...observed, void: true };
  return { startMl, endMl: endMl ?? startMl, ...observed };
}

function noteOf({ note, runs }: CheckDraft): string {
  const voids = runs.flatMap((run, index) =>
    run.voided ? [`Run ${index + 1} is void: ${voidWords[run.voided]}.`] : [],
  );
  return [note.trim(), ...voids].filter(Boolean).join("\n");
}

/** The runs that are read or void, as an entry holds them. */
const recordedRuns = (draft: CheckDraft, sequence: Sequence | null): Run[] =>
  draft.runs.flatMap((run, index) => (isOver(run) ? [asRun(draft, index + 1, run, sequence)] : []));

/** What a check holds; `runs` where they were not read as levels. */
export function checkBody(
  draft: CheckDraft,
  sequence: Sequence | null,
  runs = recordedRuns(draft, sequence),
): CheckBody {
  const oilTempC = parseDecimal(draft.oilTempText);
  const note = noteOf(draft);
  return {
    syringe: draft.syringe,
    runs,
    ...(oilTempC === null ? {} : { oilTempC }),
    ...(draft.spoilers.length > 0 ? { spoilers: draft.spoilers } : {}),
    closedOut: isClosedOut(draft.closeOut),
    ...(draft.estimatedHours ? { estimatedHours: true } : {}),
    ...(note ? { note } : {}),
  };
}

/** The entry that a draft stands for; null while its hours are not known or no run is over. */
export function checkEntry(
  draft: CheckDraft,
  bike: { bikeId: string; sequence: Sequence | null },
  runs?: Run[],
): CheckEntry | null {
  const hours = parseHours(draft.hoursText);
  const body = checkBody(draft, bike.sequence, runs);
  if (hours === null || body.runs.length === 0) return null;
  return { bikeId: bike.bikeId, kind: "check", at: draft.at, hours, body };
}
