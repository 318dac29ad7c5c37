import { describe, expect, test } from "vitest";
import { identifySequence } from "./identify-sequence.ts";
import { usualSequences } from "./usual-sequences.ts";

describe("identifySequence", () => {
  test("knows a long single-rate run (the documented example)", () => {
    expect(identifySequence({ seconds: 57, rhythm: "steady" })).toBe("single-rate-long");
  });

  test("knows each usual sequence by its own length and rhythm", () => {
    for (const { id, seconds, rhythm } of usualSequences)
      expect(identifySequence({ seconds, rhythm })).toBe(id);
  });

  test("tells the two 30 s sequences apart by their rhythm", () => {
    expect(identifySequence({ seconds: 31, rhythm: "steady" })).toBe("single-rate-short");
    expect(identifySequence({ seconds: 31, rhythm: "alternating" })).toBe("two-rate");
  });

  test.each([
    { seconds: 45, rhythm: "steady" },
    { seconds: 60, rhythm: "alternating" },
    { seconds: 23, rhythm: "steady" },
    { seconds: 0, rhythm: "steady" },
    { seconds: Number.NaN, rhythm: "steady" },
  ] as const)("calls $seconds s $rhythm the bike's own", (run) => {
    expect(identifySequence(run)).toBe("own");
  });
});
