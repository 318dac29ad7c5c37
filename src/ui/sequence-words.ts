import type { Rhythm, Sequence } from "../../shared/schemas/entry.ts";

export const rhythmWords: Record<Rhythm, string> = {
  steady: "one fast rate",
  alternating: "slow and fast in turn",
};

/** `30 s, one fast rate` */
export const sequenceWords = ({ seconds, rhythm }: Pick<Sequence, "seconds" | "rhythm">) =>
  `${seconds}\u00a0s, ${rhythmWords[rhythm]}`;
