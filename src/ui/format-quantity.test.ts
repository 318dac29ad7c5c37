import { describe, expect, it } from "vitest";
import { formatMl, formatMlGiveOrTake, formatPercent } from "./format-quantity.ts";

const spaced = (text: string) => text.replaceAll("\u00a0", " ");

describe("formatMl", () => {
  it("shows two decimals", () => expect(spaced(formatMl(3))).toBe("3.00 mL"));

  it("gives or takes two standard uncertainties", () =>
    expect(spaced(formatMlGiveOrTake(2.5, 0.06))).toBe("2.50 ± 0.12 mL"));
});

describe("formatPercent", () => {
  it("rounds to whole percent", () => expect(spaced(formatPercent(0.648))).toBe("65 %"));

  it("never calls the nearly certain certain", () => {
    expect(spaced(formatPercent(0.002))).toBe("under 1 %");
    expect(spaced(formatPercent(0.9991))).toBe("over 99 %");
    expect(spaced(formatPercent(0))).toBe("0 %");
    expect(spaced(formatPercent(1))).toBe("100 %");
  });
});
