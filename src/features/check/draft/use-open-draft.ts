import { CHECK_FORM, isHoseMaybeOff, type BikeRecord } from "../../../offline/index.ts";
import { parseHours } from "../../../ui/parse-hours.ts";
import { stepPaths } from "../check-paths.ts";
import type { OpenCheckContext } from "../open-check.ts";
import { meanReadMl } from "./check-draft.ts";
import { checkDraftSchema, type CheckDraft } from "./check-draft-schema.ts";
import { planCheck } from "./plan-check.ts";
import { useLiveDraft, type LiveDraft } from "./use-live-draft.ts";

/**
 * The bike's guided check in progress with all that follows from it; `open` is null without one.
 * `hoseMaybeOff`: a check was saved, left or given up without its close-out.
 */
export function useOpenDraft(record: BikeRecord) {
  const live = useLiveDraft(record.bikeId, CHECK_FORM, checkDraftSchema);
  const hoseMaybeOff =
    record.summary.flags.includes("not-closed-out") || isHoseMaybeOff(live.stored);
  return { ...live, hoseMaybeOff, open: live.draft && openCheck(record, live.draft, live) };
}

type Live = LiveDraft<CheckDraft>;

function openCheck(
  record: BikeRecord,
  draft: CheckDraft,
  { change, forget, unkept }: Pick<Live, "change" | "forget" | "unkept">,
): OpenCheckContext {
  const { details, summary } = record;
  const sequence = details.sequence ?? draft.sequence;
  const shown = parseHours(draft.hoursText);
  const atHours = shown === null ? null : shown + summary.hours.displayOffset;
  const readMl = meanReadMl(draft);
  const bike = { sequence, actDrop: details.actDrop, atHours, readMl };
  const plan = planCheck(summary, bike, draft.syringe);
  const nextMl = readMl ?? plan.expectedMl;
  return {
    record,
    sequence,
    plan,
    nextMl,
    draft,
    change,
    forget,
    unkept,
    paths: stepPaths(record.bikeId),
  };
}
