import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { themes } from "../../tailwind.config.ts";

const css = readFileSync("src/ui/theme.css", "utf8");

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((from) => {
    const share = parseInt(hex.slice(from, from + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, other: string): number {
  const [low = 0, high = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (high + 0.05) / (low + 0.05);
}

/** What `color-mix(in srgb, ink, paper)` gives. */
function mix(ink: string, paper: string, share: number): string {
  const channels = [1, 3, 5].map((from) => {
    const value = (hex: string) => parseInt(hex.slice(from, from + 2), 16);
    return Math.round(share * value(ink) + (1 - share) * value(paper));
  });
  return `#${channels.map((channel) => channel.toString(16).padStart(2, "0")).join("")}`;
}

describe("theme", () => {
  it("says the same in theme.css as in the tokens", () => {
    const written = [...css.matchAll(/--(\w+): light-dark\((#\w+), (#\w+)\)/g)].map(
      ([, name, light, dark]) => [name, light?.toUpperCase(), dark?.toUpperCase()],
    );
    const tokens = Object.entries(themes.light).map(([name, light]) => [
      name,
      light.toUpperCase(),
      themes.dark[name as keyof typeof themes.dark].toUpperCase(),
    ]);
    expect(written).toEqual(tokens);
  });

  describe.each(Object.entries(themes))("%s", (_, theme) => {
    const soft = mix(theme.ink, theme.paper, 0.7);
    const texts = { ...theme, soft } as Record<string, string>;

    it.each(["ink", "soft", "oil", "holding", "dropping", "low"])(
      "keeps %s readable as text on paper and card",
      (name) => {
        for (const ground of [theme.paper, theme.card])
          expect(contrast(texts[name] ?? "", ground)).toBeGreaterThanOrEqual(4.5);
      },
    );

    it("keeps paper readable on a filled button", () => {
      for (const ground of [theme.ink, theme.low])
        expect(contrast(theme.paper, ground)).toBeGreaterThanOrEqual(4.5);
    });

    it("keeps the marks of the Column visible on its oil and its glass", () => {
      for (const ground of [theme.honey, theme.paper])
        expect(contrast(theme.ink, ground)).toBeGreaterThanOrEqual(3);
      expect(contrast(theme.oil, theme.paper)).toBeGreaterThanOrEqual(3);
      expect(contrast(theme.low, theme.paper)).toBeGreaterThanOrEqual(3);
    });

    it("tells the edges of fields and quiet buttons from what lies behind them", () => {
      const edge = mix(theme.ink, theme.paper, 0.55);
      for (const ground of [theme.paper, theme.card])
        expect(contrast(edge, ground)).toBeGreaterThanOrEqual(3);
    });
  });
});
