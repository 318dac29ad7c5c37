import { describe, expect, it } from "vitest";
import { certaintySentence } from "./certainty-sentence.ts";

const say = (pLow: number | null, runsToSettle: number | null, flags: string[] = []) =>
  certaintySentence({ pLow, runsToSettle, flags })?.replaceAll("\u00a0", " ") ?? null;

describe("certaintySentence", () => {
  it("says how sure it is that the delivery is low, and how many runs would settle it", () => {
    expect(say(0.65, 7)).toBe(
      "65 % sure the delivery is below the limit; 7 more runs would settle it.",
    );
    expect(say(0.13, 1)).toBe(
      "87 % sure the delivery is above the limit; one more run would settle it.",
    );
  });

  it("says so where neither baseline nor syringe can settle it", () => {
    expect(say(0.65, null, ["baseline-cannot-settle"])).toMatch(
      /this baseline cannot settle it, so treat the delivery as low\.$/,
    );
    expect(say(0.65, null)).toMatch(/this syringe cannot settle it\.$/);
  });

  it("is never wholly sure", () => {
    expect(say(0.0025, 0)).toBe("Over 99 % sure the delivery is above the limit.");
    expect(say(1, 0)).toBe("100 % sure the delivery is below the limit.");
  });

  it("says nothing while there is nothing to compare with", () => {
    expect(say(null, null)).toBeNull();
  });
});
