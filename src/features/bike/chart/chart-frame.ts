import { scaleLinear, type ScaleLinear } from "d3-scale";
import type { ChartModel, SeriesBreak } from "./chart-model.ts";

export interface ChartSize {
  width: number;
  /** The reader's text size, px: all distances of the chart follow it. */
  remPx: number;
}

export interface BreakLabel {
  lineX: number;
  x: number;
  y: number;
  text: string;
  /** Which way the words run from their line. */
  anchor: "start" | "end";
}

export interface ChartFrame {
  width: number;
  height: number;
  fontPx: number;
  plot: { left: number; right: number; top: number; bottom: number };
  x: ScaleLinear<number, number>;
  y: ScaleLinear<number, number>;
  hourTicks: number[];
  ratioTicks: number[];
  breakLabels: BreakLabel[];
}

const FONT_REM = 0.8125;
/** Mean width of a letter, as a share of the font's size; generous. */
const LETTER = 0.56;
/** Height to width of the plot, between these px. */
const ASPECT = 0.62;
const LEAST_HEIGHT = 190;
const MOST_HEIGHT = 340;

/** Lays the chart out for its width and the reader's text size; what lies beyond is at its edge. */
export function chartFrame(model: ChartModel, { width, remPx }: ChartSize): ChartFrame {
  const fontPx = FONT_REM * remPx;
  const left = 3.4 * fontPx;
  const right = width - 0.5 * fontPx;
  const x = scaleLinear().domain(model.hours).range([left, right]).clamp(true);
  const { labels, lanes } = placeLabels(model.breaks, x, fontPx);
  const top = (lanes * 1.35 + 0.6) * fontPx;
  const plotHeight = Math.min(MOST_HEIGHT, Math.max(LEAST_HEIGHT, ASPECT * width));
  const bottom = top + plotHeight;
  const y = scaleLinear().domain(model.ratios).range([bottom, top]).clamp(true);
  return {
    width,
    height: bottom + 3.2 * fontPx,
    fontPx,
    plot: { left, right, top, bottom },
    x,
    y,
    hourTicks: x.ticks(Math.max(2, Math.floor((right - left) / (5 * fontPx)))),
    ratioTicks: y.ticks(Math.max(2, Math.floor(plotHeight / (2.6 * fontPx)))),
    breakLabels: labels,
  };
}

/**
 * Puts each series break's words beside its line, above the plot, in the first lane where they
 * overlap none; words longer than the plot are cut, the table below has them in full.
 */
function placeLabels(
  breaks: readonly SeriesBreak[],
  x: ScaleLinear<number, number>,
  fontPx: number,
): { labels: BreakLabel[]; lanes: number } {
  const [left = 0, right = 0] = x.range();
  const letterPx = LETTER * fontPx;
  const most = Math.max(4, Math.floor((right - left) / letterPx));
  const laneEnds: { from: number; to: number }[][] = [];
  const labels = breaks.map(({ atHours, cause }): BreakLabel => {
    const text = cause.length > most ? `${cause.slice(0, most - 1)}…` : cause;
    const at = x(atHours);
    const size = text.length * letterPx;
    // Words that would leave the plot run to the left; words too long for either side stay inside.
    const anchor = at + size <= right ? "start" : "end";
    const from = anchor === "start" ? at : Math.max(left, at - size);
    const to = from + size;
    const free = laneEnds.findIndex((lane) => lane.every((it) => to < it.from || it.to < from));
    const lane = free < 0 ? laneEnds.length : free;
    (laneEnds[lane] ??= []).push({ from, to });
    return {
      lineX: at,
      x: anchor === "start" ? from : to,
      y: (lane * 1.35 + 1) * fontPx,
      text,
      anchor,
    };
  });
  return { labels, lanes: laneEnds.length };
}
