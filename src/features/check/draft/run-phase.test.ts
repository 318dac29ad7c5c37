import { expect, test } from "vitest";
import type { RunDraft } from "./check-draft-schema.ts";
import { runPhase } from "./run-phase.ts";

const START = Date.parse("2026-03-01T09:00:00.000Z");
const run: RunDraft = {
  startText: null,
  endText: "",
  startedAt: new Date(START).toISOString(),
  seconds: null,
  rhythm: null,
  voided: null,
};
const after = (seconds: number) => START + 1000 * seconds;

test("is ready until it is started", () => {
  expect(runPhase({ ...run, startedAt: null }, 30, START)).toEqual({ phase: "ready" });
});

test("counts up to the sequence's length, then down the drip wait", () => {
  expect(runPhase(run, 30, after(12))).toEqual({ phase: "running", seconds: 12 });
  expect(runPhase(run, 30, after(30))).toEqual({ phase: "dripping", secondsLeft: 30 });
  expect(runPhase(run, 30, after(59))).toEqual({ phase: "dripping", secondsLeft: 1 });
  expect(runPhase(run, 30, after(60))).toEqual({ phase: "dripped" });
});

test("is over when next looked at, however long the phone was dead", () => {
  expect(runPhase(run, 30, after(100_000))).toEqual({ phase: "dripped" });
});

test("goes by the length it was stopped at, where that is known", () => {
  expect(runPhase({ ...run, seconds: 12 }, 30, after(20))).toEqual({
    phase: "dripping",
    secondsLeft: 22,
  });
});

test("goes on until stopped where the length is not known, and is forgotten after ten minutes", () => {
  expect(runPhase(run, null, after(600))).toEqual({ phase: "running", seconds: 600 });
  expect(runPhase(run, null, after(601))).toEqual({ phase: "forgotten" });
});

test("takes a clock set back for no time passed", () => {
  expect(runPhase(run, 30, after(-5))).toEqual({ phase: "running", seconds: 0 });
});
