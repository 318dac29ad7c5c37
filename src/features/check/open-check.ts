import { useOutletContext } from "react-router-dom";
import type { Sequence } from "../../../shared/schemas/entry.ts";
import type { BikeRecord } from "../../offline/index.ts";
import type { StepPaths } from "./check-paths.ts";
import type { CheckDraft } from "./draft/check-draft-schema.ts";
import type { CheckPlan } from "./draft/plan-check.ts";

/** A guided check in progress, as every step of it sees it. */
export interface OpenCheckContext {
  record: BikeRecord;
  /** The bike's sequence, or the one chosen in this check; null while it is to be found out. */
  sequence: Sequence | null;
  plan: CheckPlan;
  /** What the next run is likely to give, for knowing whether it fits the barrel. */
  nextMl: number | null;
  draft: CheckDraft;
  change: (edit: (draft: CheckDraft) => CheckDraft) => void;
  /** After the entry was saved: the draft went with it. */
  forget: () => void;
  /** True where this phone does not keep the draft. */
  unkept: boolean;
  paths: StepPaths;
}

export const useOpenCheck = () => useOutletContext<OpenCheckContext>();
