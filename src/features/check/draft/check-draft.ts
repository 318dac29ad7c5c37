/** How a guided check's draft changes; nothing here is changed in place. Runs are counted from 1. */
import { MAX_RUNS, type Spoiler } from "../../../../shared/schemas/entry.ts";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import {
  closeOutItems,
  type CheckDraft,
  type CloseOutItem,
  type RunDraft,
  type VoidReason,
} from "./check-draft-schema.ts";

/** This share of the barrel is used: the last marks are hard to read before it runs over. */
const USABLE_SHARE = 0.95;

const untouchedRun: RunDraft = {
  startText: null,
  endText: "",
  startedAt: null,
  seconds: null,
  rhythm: null,
  voided: null,
};

type Beginning = Pick<
  CheckDraft,
  "at" | "hoursText" | "estimatedHours" | "syringe" | "hoseMaybeOff"
>;

export function beginCheck(beginning: Beginning): CheckDraft {
  return {
    ...beginning,
    oilTempText: "",
    sequence: null,
    spoilers: [],
    runs: [],
    closeOut: [],
    note: "",
  };
}

/** A run as recorded, or one that is still to come. */
export const runAt = (draft: CheckDraft, n: number): RunDraft => draft.runs[n - 1] ?? untouchedRun;

const isRead = (run: RunDraft) => !run.voided && parseDecimal(run.endText) !== null;
export const isOver = (run: RunDraft) => run.voided !== null || isRead(run);

/** The run to do next: the first that is neither read nor void. */
export function nextRun({ runs }: CheckDraft): number {
  const open = runs.findIndex((run) => !isOver(run));
  return open < 0 ? runs.length + 1 : open + 1;
}

/** One run more is still a check that can be saved. */
export const mayAddRun = (draft: CheckDraft) => nextRun(draft) <= MAX_RUNS;

export const readRuns = ({ runs }: CheckDraft) => runs.filter(isRead);

/** How many runs count up to and with the nth, which is what a rider calls its number. */
export const countedNumber = ({ runs }: CheckDraft, n: number) =>
  runs.slice(0, n - 1).filter((run) => !run.voided).length + 1;

export function changeRun(draft: CheckDraft, n: number, change: Partial<RunDraft>): CheckDraft {
  const runs = [...draft.runs];
  runs[n - 1] = { ...runAt(draft, n), ...change };
  return { ...draft, runs };
}

export const startRun = (draft: CheckDraft, n: number, startedAt: string): CheckDraft => ({
  ...changeRun(draft, n, { startedAt, seconds: null, voided: null }),
  hoseMaybeOff: true,
});

export const voidRun = (draft: CheckDraft, n: number, voided: VoidReason | null): CheckDraft => ({
  ...changeRun(draft, n, { voided }),
  hoseMaybeOff: true,
});

/** The spoilers ticked among those a step offers; those of other steps stay as they are. */
export const chooseSpoilers = (
  draft: CheckDraft,
  offered: readonly Spoiler[],
  chosen: readonly Spoiler[],
): CheckDraft => ({
  ...draft,
  spoilers: [...draft.spoilers.filter((spoiler) => !offered.includes(spoiler)), ...chosen],
});

export const isClosedOut = (closeOut: readonly CloseOutItem[]) =>
  closeOutItems.every((item) => closeOut.includes(item));

const isBegun = (run: RunDraft) =>
  run.startedAt !== null || run.voided !== null || run.endText !== "";

/** Where a run starts: as typed, or as the run before left the barrel. */
export function startTextOf(draft: CheckDraft, n: number, expectedMl: number | null): string {
  const run = runAt(draft, n);
  if (run.startText !== null) return run.startText;
  return isBegun(run) ? levelBefore(draft, n) : proposeStart(draft, n, expectedMl);
}

/** What the run before left in the barrel; the first run starts on the 0 mark. */
function levelBefore(draft: CheckDraft, n: number): string {
  if (n <= 1) return "0";
  const before = runAt(draft, n - 1);
  return before.voided === "not-started" ? startTextOf(draft, n - 1, null) : before.endText;
}

/**
 * A run goes on in one barrel where there is room for it. An emptied barrel keeps a film, so its
 * level is asked for: nothing is proposed.
 */
export function proposeStart(draft: CheckDraft, n: number, expectedMl: number | null): string {
  const text = levelBefore(draft, n);
  const levelMl = parseDecimal(text);
  return levelMl !== null && hasRoom(draft, levelMl, expectedMl) ? text : "";
}

/** Whether one run more fits on top of a level. */
export function hasRoom(
  { syringe }: Pick<CheckDraft, "syringe">,
  levelMl: number,
  expectedMl: number | null,
) {
  if (!syringe) return true;
  // The hair is for sums that rounding left just over the mark.
  return levelMl + (expectedMl ?? 0) <= USABLE_SHARE * syringe.capacityMl + 1e-9;
}

/** Mean of the runs read so far, mL; null before the first. */
export function meanReadMl(draft: CheckDraft): number | null {
  const volumes = draft.runs.flatMap((run, index) => {
    const start = parseDecimal(startTextOf(draft, index + 1, null));
    const end = parseDecimal(run.endText);
    return isRead(run) && start !== null && end !== null ? [end - start] : [];
  });
  if (volumes.length === 0) return null;
  return volumes.reduce((sum, volume) => sum + volume, 0) / volumes.length;
}

/** What stays of a check that is given up: whether the hose may be off, nothing else. */
export const abandoned = ({ hoseMaybeOff }: CheckDraft) => (hoseMaybeOff ? { hoseMaybeOff } : null);
