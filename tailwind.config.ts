import type { Config } from "tailwindcss";

/**
 * The tokens of the look, once. A token named here as `var(--…)` changes with the theme;
 * both values stand in `themes`, which src/ui/theme.css is tested against.
 */
export const themes = {
  light: {
    paper: "#F7F4EC",
    card: "#FDFBF6",
    ink: "#1B1E20",
    rule: "#D8D1C0",
    oil: "#8A5A00",
    honey: "#CF9430",
    holding: "#0E5F55",
    dropping: "#8A4B00",
    low: "#9B1C1C",
  },
  dark: {
    paper: "#15181A",
    card: "#1B1F22",
    ink: "#ECE7DA",
    rule: "#34393C",
    oil: "#E0A63A",
    honey: "#805A18",
    holding: "#5CC3B2",
    dropping: "#F0A95A",
    low: "#FF8A80",
  },
} as const;

/** Ink thinned with paper: 70 % for second-rank words and *settling*, 55 % for edges of controls. */
const thinned = (percent: number) => `color-mix(in srgb, var(--ink) ${percent}%, var(--paper))`;
const themed = (name: keyof typeof themes.light) => `var(--${name})`;

export default {
  content: ["./index.html", "./src/**/*.{ts,tsx}"],
  theme: {
    extend: {
      colors: {
        paper: themed("paper"),
        card: themed("card"),
        ink: themed("ink"),
        soft: thinned(70),
        edge: thinned(55),
        rule: themed("rule"),
        oil: themed("oil"),
        // Oil seen through glass: only ever behind the marks of the Column.
        honey: themed("honey"),
        holding: themed("holding"),
        dropping: themed("dropping"),
        low: themed("low"),
        settling: thinned(70),
      },
      fontFamily: { sans: ["Atkinson Hyperlegible", "system-ui", "sans-serif"] },
      // The one figure of a card or screen: 57 px on the narrowest phone, and no wider than it
      // when letters are set large.
      fontSize: {
        figure: ["min(18vw, 4.5rem)", "1"],
        "figure-xl": ["min(22vw, 5rem)", "1"],
        "figure-long": ["min(14vw, 3.5rem)", "1"],
      },
      borderRadius: { card: "12px" },
      minHeight: { target: "var(--target)" },
      minWidth: { target: "var(--target)" },
    },
  },
} satisfies Config;
