import { describe, expect, it } from "vitest";
import { parseDecimal } from "./parse-decimal.ts";

describe("parseDecimal", () => {
  it.each([
    ["3.8", 3.8],
    ["3,8", 3.8],
    [" 12 ", 12],
    ["0", 0],
    [".5", 0.5],
    [",5", 0.5],
    ["7.", 7],
    ["-4.5", -4.5],
    ["−4,5", -4.5],
  ])("reads %j as %d", (text, number) => expect(parseDecimal(text)).toBe(number));

  it.each(["", " ", ".", "-", "1,234.5", "1.2.3", "3 8", "1e3", "2:30", "3mL", "Infinity"])(
    "does not guess at %j",
    (text) => expect(parseDecimal(text)).toBeNull(),
  );
});
