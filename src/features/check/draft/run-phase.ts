import type { RunDraft } from "./check-draft-schema.ts";

/** The last drops fall for this long after the pump stops; always the same, so that runs compare. */
export const DRIP_SECONDS = 30;
/** No priming sequence is longer: a timer still running then was forgotten. */
export const LONGEST_SECONDS = 600;

export type RunPhase =
  | { phase: "ready" }
  | { phase: "running"; seconds: number }
  | { phase: "dripping"; secondsLeft: number }
  | { phase: "dripped" }
  /** The timer ran on unwatched: how long the pump ticked has to be typed. */
  | { phase: "forgotten" };

/**
 * Where a run stands, from the instant it was started: nothing has to happen at the right moment,
 * so a reload, a phone call or a flat battery changes nothing.
 * Edges: a clock set back counts as no time passed; without a known length (`expectedSeconds` null)
 * a run goes on until it is stopped.
 */
export function runPhase(run: RunDraft, expectedSeconds: number | null, nowMs: number): RunPhase {
  if (run.startedAt === null) return { phase: "ready" };
  const passed = Math.max(0, (nowMs - Date.parse(run.startedAt)) / 1000);
  const length = run.seconds ?? expectedSeconds;
  if (length === null)
    return passed > LONGEST_SECONDS
      ? { phase: "forgotten" }
      : { phase: "running", seconds: passed };
  if (passed < length) return { phase: "running", seconds: passed };
  const secondsLeft = length + DRIP_SECONDS - passed;
  return secondsLeft > 0 ? { phase: "dripping", secondsLeft } : { phase: "dripped" };
}
