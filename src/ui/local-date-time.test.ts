import { afterEach, describe, expect, it } from "vitest";
import { fromLocalDateTime, toLocalDateTime } from "./local-date-time.ts";

const home = process.env.TZ;
afterEach(() => {
  process.env.TZ = home;
  if (home === undefined) delete process.env.TZ;
});

// Offsets as the IANA time zone database has them for that day.
const noonInJune = [
  ["UTC", "2026-06-01T12:00"],
  ["Europe/Berlin", "2026-06-01T14:00"],
  ["America/St_Johns", "2026-06-01T09:30"],
  ["Pacific/Kiritimati", "2026-06-02T02:00"],
  ["Pacific/Pago_Pago", "2026-06-01T01:00"],
  ["Asia/Kathmandu", "2026-06-01T17:45"],
];

describe.each(noonInJune)("in %s", (zone, local) => {
  it("shows an instant as the clock on the wall", () => {
    process.env.TZ = zone;
    expect(toLocalDateTime("2026-06-01T12:00:00.000Z")).toBe(local);
  });

  it("names the same instant again from what it shows", () => {
    process.env.TZ = zone;
    expect(fromLocalDateTime(local)).toBe("2026-06-01T12:00:00.000Z");
  });
});

describe("fromLocalDateTime", () => {
  it("takes an hour that the clocks skip for the one after", () => {
    process.env.TZ = "Europe/Berlin";
    expect(fromLocalDateTime("2026-03-29T02:30")).toBe("2026-03-29T01:30:00.000Z");
  });

  it("takes an hour that the clocks repeat for its first", () => {
    process.env.TZ = "Europe/Berlin";
    expect(fromLocalDateTime("2026-10-25T02:30")).toBe("2026-10-25T00:30:00.000Z");
  });

  it.each(["", "soon", "2026-13-01T00:00"])("finds no instant in %j", (local) =>
    expect(fromLocalDateTime(local)).toBeNull(),
  );
});
