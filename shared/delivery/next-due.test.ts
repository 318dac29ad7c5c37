import { describe, expect, it } from "vitest";
import { checkIntervalHours, nextDue, type DueInput } from "./next-due.ts";

const READ_AT = Date.parse("2026-06-01T00:00:00Z");
const usual: DueInput = {
  intervalHours: 20,
  session: { atHours: 32, verdict: "holding", action: "ride" },
  unplaced: null,
  limitFromHours: null,
  hoursNow: 32,
  readAtMs: READ_AT,
  hoursPerWeek: null,
};
type Changes = Partial<Omit<DueInput, "session">> & { session?: Partial<DueInput["session"]> };
const due = ({ session, ...changes }: Changes) =>
  nextDue({ ...usual, ...changes, session: { ...usual.session!, ...session } });

describe("checkIntervalHours", () => {
  // 20 to 40 h, the longer with a screen ahead of the pump: common practice, no published source.
  it("is 40 h with a screen, 20 h without or where that is not known, or the bike's own", () => {
    expect(checkIntervalHours({ intervalHours: null, hasScreen: true })).toBe(40);
    expect(checkIntervalHours({ intervalHours: null, hasScreen: false })).toBe(20);
    expect(checkIntervalHours({ intervalHours: null, hasScreen: null })).toBe(20);
    expect(checkIntervalHours({ intervalHours: 25, hasScreen: true })).toBe(25);
  });
});

describe("nextDue", () => {
  it("adds the interval while holding or settling", () => {
    expect(due({})).toMatchObject({ atHours: 52, inHours: 20, overdue: false });
    expect(due({ session: { verdict: "settling" } })).toMatchObject({ atHours: 52 });
  });

  it("adds half of it while dropping", () => {
    expect(due({ session: { verdict: "dropping" } })).toMatchObject({ atHours: 42, inHours: 10 });
  });

  it("is due at the session's hours after repeat and stop, and overdue once ridden", () => {
    for (const action of ["repeat", "stop"] as const) {
      expect(due({ session: { action } })).toMatchObject({ atHours: 32, overdue: false });
      expect(due({ session: { action }, hoursNow: 33 })).toMatchObject({
        inHours: -1,
        overdue: true,
      });
    }
  });

  it("is due now without a check, counted from zero without a reading", () => {
    expect(nextDue({ ...usual, session: null })).toMatchObject({
      atHours: 32,
      inHours: 0,
      overdue: false,
    });
    expect(nextDue({ ...usual, session: null, hoursNow: null })).toMatchObject({ atHours: 0 });
  });

  it("checks a declining pump halfway to where it may be low, after an hour at least", () => {
    expect(due({ limitFromHours: 48 })).toMatchObject({ atHours: 40 });
    expect(due({ limitFromHours: 32.5 })).toMatchObject({ atHours: 33 });
    expect(due({ limitFromHours: 10 })).toMatchObject({ atHours: 33 });
    expect(due({ limitFromHours: 900 })).toMatchObject({ atHours: 52 });
  });

  it("names the likely date where the use is known", () => {
    // 20 h at 5 h a week are 4 weeks.
    expect(due({ hoursPerWeek: 5 }).onDate).toBe("2026-06-29");
    expect(due({ hoursPerWeek: null }).onDate).toBeNull();
    expect(due({ hoursPerWeek: 0 }).onDate).toBeNull();
    expect(due({ hoursPerWeek: 1e-9 }).onDate).toBeNull();
  });

  it("is due now, and says why, where the session's hours cannot be counted from", () => {
    const below = due({ unplaced: "hours-below-session", session: { atHours: 120 } });
    expect(below).toMatchObject({ atHours: 32, inHours: 0 });
    expect(below.reason).toMatch(/meter change/);
  });
});
