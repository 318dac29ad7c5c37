import { afterEach, describe, expect, it } from "vitest";
import { formatDate, formatDay, formatSince, formatWhen } from "./format-when.ts";

const home = process.env.TZ;
afterEach(() => {
  process.env.TZ = home;
  if (home === undefined) delete process.env.TZ;
});

const lateInJune = "2026-06-30T23:30:00.000Z";

describe.each([
  ["UTC", "30 Jun 2026", "23:30"],
  ["Europe/Berlin", "1 Jul 2026", "01:30"],
  ["America/Los_Angeles", "30 Jun 2026", "16:30"],
  ["Pacific/Auckland", "1 Jul 2026", "11:30"],
])("in %s", (zone, day, time) => {
  it("shows an instant on the rider's own day and clock", () => {
    process.env.TZ = zone;
    expect(formatDay(lateInJune)).toBe(day);
    expect(formatWhen(lateInJune)).toBe(`${day}, ${time}`);
  });

  it("says since when by the clock today and by the day otherwise", () => {
    process.env.TZ = zone;
    expect(formatSince(lateInJune, new Date(lateInJune))).toBe(time);
    expect(formatSince(lateInJune, new Date("2026-08-01T12:00:00Z"))).toBe(day.slice(0, -5));
  });

  it("leaves a date without a time on its day", () => {
    process.env.TZ = zone;
    expect(formatDate("2027-01-02")).toBe("2 Jan 2027");
  });
});
