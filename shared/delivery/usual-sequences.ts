/**
 * The kinds of priming sequence in use, with what a sound pump delivers in one: a first guess until
 * a bike has its own baseline. Common practice of the trade, no published source.
 */
export const usualSequences = [
  { id: "single-rate-long", seconds: 60, rhythm: "steady", nominalMl: 5.5 },
  { id: "single-rate-short", seconds: 30, rhythm: "steady", nominalMl: 3 },
  { id: "two-rate", seconds: 30, rhythm: "alternating", nominalMl: 1 },
] as const;

export type UsualSequenceId = (typeof usualSequences)[number]["id"];
