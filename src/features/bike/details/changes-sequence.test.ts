import { describe, expect, it } from "vitest";
import { changesSequence } from "./changes-sequence.ts";

const thirty = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
const form = (sequence: string, ownSeconds = "", ownRhythm = "steady") =>
  ({ sequence, ownSeconds, ownRhythm }) as Parameters<typeof changesSequence>[1];

describe("changesSequence", () => {
  it("warns only where one known sequence becomes another", () => {
    expect(changesSequence({ sequence: thirty }, form("single-rate-long"))).toBe(true);
    expect(changesSequence({ sequence: thirty }, form("two-rate"))).toBe(true);
    expect(changesSequence({ sequence: thirty }, form("own", "45"))).toBe(true);
  });

  it("does not where it is the same, unknown, or not typed yet", () => {
    expect(changesSequence({ sequence: thirty }, form("single-rate-short"))).toBe(false);
    expect(changesSequence({ sequence: thirty }, form("own", "30"))).toBe(false);
    expect(changesSequence({ sequence: thirty }, form("unknown"))).toBe(false);
    expect(changesSequence({ sequence: null }, form("two-rate"))).toBe(false);
    expect(changesSequence({ sequence: thirty }, form("own", ""))).toBe(false);
  });
});
