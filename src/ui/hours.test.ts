import { describe, expect, it } from "vitest";
import { formatHours } from "./format-hours.ts";
import { parseHours } from "./parse-hours.ts";

describe("parseHours", () => {
  it.each([
    ["2:30", 2.5],
    ["0:06", 0.1],
    ["12:5", 12 + 5 / 60],
    ["2,5", 2.5],
    ["320", 320],
  ])("reads %j as %d", (text, hours) => expect(parseHours(text)).toBeCloseTo(hours, 12));

  it.each(["2:60", ":30", "2:", "1:2:3", ""])("does not guess at %j", (text) =>
    expect(parseHours(text)).toBeNull(),
  );
});

describe("formatHours", () => {
  it("shows one decimal", () => {
    expect(formatHours(12)).toBe("12.0");
    expect(formatHours(-3.25)).toBe("−3.3");
    expect(formatHours(-0.04)).toBe("0.0");
  });

  it("shows hours and minutes on an hh:mm meter", () => {
    expect(formatHours(2.5, "hh:mm")).toBe("2:30");
    expect(formatHours(1.999, "hh:mm")).toBe("2:00");
    expect(formatHours(-0.5, "hh:mm")).toBe("−0:30");
  });
});
