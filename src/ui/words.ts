import type { Action, Verdict } from "../../shared/schemas/entry.ts";

/** Always *delivery low*, never just *low*: it must not read as the oil level. */
export const verdictWords: Record<Verdict, string> = {
  none: "No check yet",
  settling: "Delivery settling",
  holding: "Delivery holding",
  dropping: "Delivery dropping",
  low: "Delivery low",
};

export const actionWords: Record<Action, string> = {
  ride: "Ride on",
  repeat: "Repeat before riding",
  stop: "Stop, find the cause",
};
