import { describe, expect, it } from "vitest";
import type { LineUpFacts } from "../../../../shared/schemas/club.ts";
import { hoursLeftWords, ratioWords, remarksOf, trendWords } from "./line-up-words.ts";

const plain = (words: string) => words.replaceAll("\u00a0", " ");

describe("the words of the Line-up", () => {
  it("tells the hours left, over, or that it is time", () => {
    expect([12.44, -3.16, 0.04, -0.04].map((hours) => plain(hoursLeftWords(hours)))).toEqual([
      "12.4 h left",
      "3.2 h over",
      "due now",
      "due now",
    ]);
  });

  it("tells a trend over ten hours, and what rounds to nothing as level", () => {
    expect([-0.00214, 0.0005, 0.00004, null].map((trend) => plain(trendWords(trend)))).toEqual([
      "−2.1 % in 10 h",
      "+0.5 % in 10 h",
      "level",
      "–",
    ]);
  });

  it("tells the delivery in whole percent of the baseline", () => {
    expect([0.9985, 0.851, null].map((ratio) => plain(ratioWords(ratio)))).toEqual([
      "100 %",
      "85 %",
      "–",
    ]);
  });

  it("remarks on what a verdict does not show", () => {
    const facts: LineUpFacts = {
      bikeId: "moss",
      name: "Moss",
      tag: "222223",
      place: "stop",
      action: null,
      verdict: "none",
      ratio: null,
      trendPerHour: null,
      hoursNow: null,
      dueInHours: 0,
      onDate: null,
      lastCheckAt: null,
      pumpHours: null,
      limitsTightened: true,
      lowCheckStruck: true,
      stopAdvised: true,
      hoseMaybeOff: false,
    };
    expect(remarksOf(facts)).toEqual([
      "Stop advised",
      "No baseline yet",
      "Limits tightened",
      "A low check struck",
    ]);
    const nothing = { limitsTightened: false, lowCheckStruck: false, stopAdvised: false };
    expect(remarksOf({ ...facts, ...nothing, verdict: "holding" })).toEqual([]);
  });
});
