import { describe, expect, it } from "vitest";
import { chartFrame } from "./chart-frame.ts";
import type { ChartModel } from "./chart-model.ts";

const model = (breaks: ChartModel["breaks"]): ChartModel => ({
  points: [],
  breaks,
  trend: null,
  undrawn: 0,
  hours: [0, 200],
  ratios: [0.7, 1.1],
  watchLimit: 0.92,
  actLimit: 0.85,
});
const breaks = [
  { atHours: 60, cause: "Pump renewed" },
  { atHours: 70, cause: "Controller updated" },
  { atHours: 190, cause: "Other sequence" },
];
const sizes = [
  { width: 288, remPx: 16 },
  { width: 328, remPx: 32 },
  { width: 560, remPx: 16 },
];
/** Generous: Atkinson Hyperlegible's letters are about half as wide as high. */
const widthOf = (text: string, fontPx: number) => 0.5 * text.length * fontPx;

describe("chartFrame", () => {
  it.each(sizes)("keeps everything inside the drawing at %o", (size) => {
    const { plot, width, height, breakLabels, fontPx } = chartFrame(model(breaks), size);
    expect(plot.left).toBeGreaterThan(0);
    expect(plot.right).toBeLessThan(width);
    expect(plot.bottom).toBeLessThan(height);
    for (const { x, text, anchor } of breakLabels) {
      const long = widthOf(text, fontPx);
      expect(anchor === "start" ? x : x - long).toBeGreaterThanOrEqual(0);
      expect(anchor === "start" ? x + long : x).toBeLessThanOrEqual(width);
    }
  });

  it.each(sizes)("lets no two labels of series breaks overlap at %o", (size) => {
    const { breakLabels, fontPx } = chartFrame(model(breaks), size);
    const boxes = breakLabels.map(({ x, y, text, anchor }) => {
      const long = widthOf(text, fontPx);
      return { y, from: anchor === "start" ? x : x - long, to: anchor === "start" ? x + long : x };
    });
    for (const a of boxes)
      for (const b of boxes)
        if (a !== b && a.y === b.y) expect(a.to < b.from || b.to < a.from).toBe(true);
  });

  it("cuts a label that is longer than the plot", () => {
    const cause = "Pump renewed, hose renewed, controller updated, oil changed";
    const { breakLabels } = chartFrame(model([{ atHours: 100, cause }]), sizes[0]!);
    expect(breakLabels[0]?.text).toMatch(/^Pump renewed.+…$/);
  });

  it("puts what lies beyond the scales at their edge", () => {
    const { x, y, plot } = chartFrame(model([]), sizes[0]!);
    expect(y(0.1)).toBe(plot.bottom);
    expect(x(900)).toBe(plot.right);
  });

  it("thins the ticks where there is little room", () => {
    const [narrow, , wide] = sizes.map((size) => chartFrame(model([]), size));
    expect(narrow!.hourTicks.length).toBeLessThan(wide!.hourTicks.length);
    expect(narrow!.hourTicks.length).toBeGreaterThanOrEqual(2);
  });
});
