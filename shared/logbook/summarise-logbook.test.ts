import { describe, expect, it } from "vitest";
import type { LogEntry } from "../schemas/entry.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { summariseLogbook } from "./summarise-logbook.ts";

const OWNER = "owner";
const summarise = (entries: LogEntry[]) => summariseLogbook({ ownerId: OWNER, entries });

describe("a check against its baseline (one run each, 5 mL barrel with 0.2 mL marks)", () => {
  const after = (secondMl: number, patch = {}) =>
    summarise(
      logbook()
        .bike({ name: "Moss", ...patch })
        .check(12, [3.0])
        .check(32, [secondMl]).entries,
    );

  it("settles on the first", () => {
    const summary = summarise(logbook().bike({ name: "Moss" }).check(12, [3.0]).entries);
    expect(summary).toMatchObject({ verdict: "settling", action: "ride", pLow: null });
    expect(summary.due).toMatchObject({ atHours: 32, inHours: 20, overdue: false });
    expect(summary.checks[0]).toMatchObject({ ratio: null, uRatio: null, runsToSettle: null });
  });

  // The three worked cases of docs/measurement.md, worked by hand from its formulas.
  it("calls 2.5 mL after 3.0 low, stop, due now", () => {
    const summary = after(2.5);
    expect(summary).toMatchObject({ verdict: "low", action: "stop" });
    expect(summary.pLow).toBeCloseTo(0.65, 2);
    expect(summary.due).toMatchObject({ atHours: 32, inHours: 0, overdue: false });
  });

  it("calls 2.7 mL dropping, repeat, due now", () => {
    const summary = after(2.7);
    expect(summary).toMatchObject({ verdict: "dropping", action: "repeat" });
    expect(summary.pLow).toBeCloseTo(0.13, 2);
    expect(summary.due).toMatchObject({ atHours: 32, inHours: 0 });
  });

  it("calls 2.95 mL holding, ride, due after the bike's interval", () => {
    const summary = after(2.95);
    expect(summary).toMatchObject({ verdict: "holding", action: "ride" });
    expect(summary.pLow).toBeCloseTo(0.0025, 4);
    expect(summary.due).toMatchObject({ atHours: 52, inHours: 20 });
    expect(after(2.95, { intervalHours: 40 }).due.atHours).toBe(72);
    expect(after(2.95, { hasScreen: true }).due.atHours).toBe(72);
  });

  it("settles 2.7 mL with three runs each, a fill a run: dropping, ride, half the interval", () => {
    const summary = summarise(
      logbook().bike({ name: "Moss" }).check(12, [3, 3, 3]).check(32, [2.7, 2.7, 2.7]).entries,
    );
    expect(summary).toMatchObject({ verdict: "dropping", action: "ride" });
    expect(summary.due).toMatchObject({ atHours: 42, inHours: 10 });
  });
});

describe("a first check that delivers next to nothing", () => {
  const after = (firstMl: number) =>
    summarise(
      logbook()
        .bike({ name: "Moss" })
        .check(12, [], { syringe: null, runs: [{ deliveredMl: firstMl }] })
        .check(32, [3]).entries,
    );

  it.each([0, 1e-310, 0.000_9])("takes %d mL for nothing: the next check is the baseline", (ml) => {
    const { checks, series } = after(ml);
    expect(checks[0]).toMatchObject({
      verdict: "low",
      action: "stop",
      flags: ["syringe-unknown", "no-delivery"],
    });
    expect(checks[1]).toMatchObject({ verdict: "settling", ratio: null });
    expect(series[0]!.baseline).toMatchObject({ atHours: 32 });
  });

  it("takes 0.01 mL for a delivery", () => {
    expect(after(0.01).checks[1]).toMatchObject({ verdict: "holding" });
    expect(after(0.01).series[0]!.baseline).toMatchObject({ atHours: 12 });
  });
});
