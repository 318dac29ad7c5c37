import { describe, expect, it } from "vitest";
import { whySentence } from "./why-sentence.ts";

const judged = (over: object) => ({
  verdict: "holding" as const,
  action: "ride" as const,
  flags: [],
  ratio: 0.98,
  uRatio: 0.045,
  ...over,
});
const say = (over: object) => whySentence(judged(over), 0.85).replaceAll("\u00a0", " ");

describe("whySentence", () => {
  it("tells the delivery as a share of the baseline", () => {
    expect(say({})).toBe("The pump delivers 98 % of its baseline, give or take 9 %.");
  });

  it("names the limit where the delivery is or may be below it", () => {
    expect(say({ verdict: "low", action: "stop", ratio: 0.83 })).toMatch(
      /83 % of its baseline, give or take 9 %: below the limit of 85 %\.$/,
    );
    expect(say({ verdict: "dropping", action: "repeat", ratio: 0.9 })).toMatch(
      /it may be below the limit of 85 %\.$/,
    );
  });

  it("says that far too much is no good news", () => {
    expect(say({ action: "repeat", ratio: 1.7, flags: ["reads-high"] })).toMatch(
      /too much to be true/,
    );
  });

  it("compares nothing while settling, or where nothing was delivered", () => {
    const settling = { verdict: "settling", ratio: null, uRatio: null };
    expect(say(settling)).toMatch(/is the baseline/);
    expect(say({ ...settling, action: "repeat", flags: ["below-usual"] })).toMatch(/be tired/);
    expect(say({ ...settling, action: "repeat", flags: ["reads-high"] })).toMatch(/far above/);
    expect(say({ verdict: "low", action: "stop", ratio: 0, flags: ["no-delivery"] })).toBe(
      "Nothing was delivered.",
    );
    expect(whySentence(null, 0.85)).toMatch(/^Make a delivery check/);
  });
});
