/** How the baseline and the two limits are drawn, on the chart and in its key. */
export const levelLooks = {
  baseline: { ink: "var(--ink)", dashes: "6 4" },
  watch: { ink: "var(--dropping)", dashes: "2 4" },
  act: { ink: "var(--low)", dashes: undefined },
} as const;
