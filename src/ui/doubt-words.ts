import type { DoubtfulReading } from "../../shared/schemas/summary.ts";

/** Why a reading of the hour meter is kept, and not counted until confirmed. */
export const doubtWords: Record<DoubtfulReading["why"], string> = {
  "below-earlier": "This is less than an earlier reading.",
  "faster-than-clock": "This is more hours than have passed since the last reading.",
};
