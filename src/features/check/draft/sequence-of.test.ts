import { expect, test } from "vitest";
import type { RunDraft } from "./check-draft-schema.ts";
import { proposeSequences } from "./sequence-of.ts";

const run = (seconds: number | null, rhythm: RunDraft["rhythm"]): RunDraft => ({
  startText: null,
  endText: "",
  startedAt: null,
  seconds,
  rhythm,
  voided: null,
});

test("proposes the usual kind that a run resembles, and the run as it was", () => {
  expect(proposeSequences(run(31.6, "alternating"))).toEqual({
    usual: { seconds: 30, rhythm: "alternating", nominalMl: 1 },
    own: { seconds: 32, rhythm: "alternating", nominalMl: null },
  });
});

test("proposes only the run itself where it resembles no usual kind", () => {
  expect(proposeSequences(run(45, "steady"))?.usual).toBeNull();
});

test("proposes nothing until length and rhythm are known", () => {
  expect(proposeSequences(run(30, null))).toBeNull();
  expect(proposeSequences(run(null, "steady"))).toBeNull();
});
