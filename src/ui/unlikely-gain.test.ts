import { describe, expect, it } from "vitest";
import { unlikelyGain } from "./unlikely-gain.ts";

const hours = {
  now: 12,
  readAt: "2026-03-11T12:00:00.000Z",
  displayOffset: 0,
  perWeek: 5,
  doubtful: [],
};
const later = "2026-03-30T12:00:00.000Z";

describe("unlikelyGain", () => {
  it("asks about 320 typed for 32.0", () => {
    expect(unlikelyGain(hours, 320, later)).toBe(
      "308\u00a0h more than on 11 Mar 2026. Is that right?",
    );
    expect(unlikelyGain({ ...hours, perWeek: null }, 320, later)).toMatch(/^308/);
  });

  it("asks nothing about a long weekend, nor about less than before", () => {
    expect(unlikelyGain(hours, 32, later)).toBeNull();
    expect(unlikelyGain(hours, 52, later)).toBeNull();
    expect(unlikelyGain(hours, 2, later)).toBeNull();
  });

  it("asks nothing about what the bike does all the time", () => {
    expect(unlikelyGain({ ...hours, perWeek: 30 }, 112, later)).toBeNull();
    // Two and five sevenths weeks of 30 h are 81.4 h, three times which is 244.3 h.
    expect(unlikelyGain({ ...hours, perWeek: 30 }, 12 + 244, later)).toBeNull();
    expect(unlikelyGain({ ...hours, perWeek: 30 }, 12 + 245, later)).not.toBeNull();
  });

  it("compares what the new meter shows after a meter change", () => {
    expect(unlikelyGain({ ...hours, now: 412, displayOffset: 400 }, 32, later)).toBeNull();
    expect(unlikelyGain({ ...hours, now: 412, displayOffset: 400 }, 320, later)).toMatch(/^308/);
  });

  it("asks nothing before the first reading, or while nothing is typed", () => {
    expect(unlikelyGain({ ...hours, now: null, readAt: null }, 320, later)).toBeNull();
    expect(unlikelyGain(hours, null, later)).toBeNull();
  });
});
