import type { Action, Verdict } from "../schemas/entry.ts";
import { conformanceProbability } from "./conformance-probability.ts";

/** One-sided 95 % of the normal distribution. */
export const Z_95 = 1.645;
/** *Ride* means at least 95 % sure that the delivery is not low. */
export const RIDE_RISK = 0.05;
/** Above this ratio, beyond doubt, something else than the pump is the matter. */
const HIGH_RATIO = 1.15;

export interface Limits {
  /** Drops from the baseline, fractions: from here *dropping*, and from here *low*. */
  watchDrop: number;
  actDrop: number;
}

export interface Judgement {
  verdict: Extract<Verdict, "holding" | "dropping" | "low">;
  action: Action;
  /** How probable it is that the true ratio lies below the limit of each. */
  pLow: number;
  pDropping: number;
}

/** Whether a ratio is high beyond doubt: r − 1.645·u > 1.15. */
export function readsHigh(ratio: number, uRatio: number): boolean {
  return ratio - Z_95 * uRatio > HIGH_RATIO;
}

/**
 * What a ratio to the baseline means, and what the rider should do.
 *
 * Formula: with P(true ≥ L) from `conformanceProbability`, pLow = 1 − P(1 − actDrop), pDropping =
 * 1 − P(1 − watchDrop). *low* if pLow ≥ ½, else *dropping* if pDropping ≥ ½, else *holding*.
 * *stop* if low; *repeat* if pLow > 0.05 or the ratio reads high; else *ride*.
 * Source: JCGM 106:2012 for the probabilities; the limits are common practice, no published source.
 *
 * @example judge(0.9, 0.045, { watchDrop: 0.08, actDrop: 0.15 }) // dropping, repeat, pLow 0.13
 */
export function judge(ratio: number, uRatio: number, limits: Limits): Judgement {
  const pLow = probabilityBelow(ratio, uRatio, 1 - limits.actDrop);
  const pDropping = probabilityBelow(ratio, uRatio, 1 - limits.watchDrop);
  const verdict = pLow >= 0.5 ? "low" : pDropping >= 0.5 ? "dropping" : "holding";
  const doubtful = pLow > RIDE_RISK || readsHigh(ratio, uRatio);
  return {
    verdict,
    action: verdict === "low" ? "stop" : doubtful ? "repeat" : "ride",
    pLow,
    pDropping,
  };
}

/** P(true < L), taken from the mirror image: 1 − P would lose the small probabilities' digits. */
function probabilityBelow(ratio: number, uRatio: number, limit: number): number {
  return conformanceProbability(-ratio, uRatio, -limit);
}
