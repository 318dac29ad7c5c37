import type { Trend } from "../../../../shared/schemas/summary.ts";
import { GIVE_OR_TAKE } from "../../../ui/format-quantity.ts";
import type { DeliveryHistory } from "../history/delivery-history.ts";
import type { HistoryPoint } from "../history/history-point.ts";

/** Room left of the first and right of the last hours, as a share of the span between them. */
const MARGIN = 0.05;
/** A short history is drawn over this many hours at least. */
const LEAST_SPAN_HOURS = 10;
/** How far past what is known a trend is drawn, as a share of the span. */
const TREND_REACH = 0.6;
/** Room kept above the baseline and below the limit, fractions of the baseline. */
const HEAD_ROOM = 0.06;

export interface ChartPoint extends HistoryPoint {
  ratio: number;
  uRatio: number;
}

export interface SeriesBreak {
  atHours: number;
  cause: string;
}

export interface TrendLine {
  from: { atHours: number; ratio: number };
  to: { atHours: number; ratio: number };
  /** Where the line may meet the limit. */
  range: { low: number; high: number } | null;
}

export interface ChartModel {
  points: ChartPoint[];
  breaks: SeriesBreak[];
  trend: TrendLine | null;
  /** Checks that have no place on the chart. */
  undrawn: number;
  hours: [number, number];
  ratios: [number, number];
  watchLimit: number;
  actLimit: number;
}

type Known = Pick<Trend, "perHour" | "reachesLimitAtHours" | "range">;

const hasRatio = (point: HistoryPoint): point is ChartPoint =>
  point.ratio !== null && point.uRatio !== null;
const isStruck = (point: HistoryPoint) => point.verdict === null;
const isWithin = ([low, high]: [number, number], value: number) => low <= value && value <= high;

/**
 * What the chart draws: every check that has a place on it, what began each later series, and the
 * trend where the delivery is declining. Struck checks never stretch the scales, so that one struck
 * for an absurd number does not press the others together.
 */
export function chartModel(history: DeliveryHistory, trend: Known | null): ChartModel {
  const measured = history.points.filter(hasRatio).filter((point) => point.hoursCount);
  const standing = measured.filter((point) => !isStruck(point));
  const breaks = history.series.slice(1).flatMap(({ atHours, cause }) => {
    return atHours === null ? [] : { atHours, cause };
  });
  const hours = hoursDomain([...standing, ...breaks], trend);
  const points = measured.filter((point) => isWithin(hours, point.atHours));
  return {
    points,
    breaks,
    trend: trendLine(history, standing, trend, hours),
    undrawn: history.points.length - points.length,
    hours,
    ratios: ratiosDomain(standing, history.actLimit),
    watchLimit: history.watchLimit,
    actLimit: history.actLimit,
  };
}

function hoursDomain(
  placed: readonly { atHours: number }[],
  trend: Known | null,
): [number, number] {
  const hours = placed.map(({ atHours }) => atHours);
  const first = Math.min(...hours);
  const last = Math.max(...hours);
  if (!Number.isFinite(first)) return [0, LEAST_SPAN_HOURS];
  const span = Math.max(last - first, LEAST_SPAN_HOURS);
  const meets = trend?.range?.high ?? trend?.reachesLimitAtHours ?? last;
  const end = Math.max(first + span, Math.min(meets, last + TREND_REACH * span));
  return [first - MARGIN * span, end + MARGIN * span];
}

function ratiosDomain(standing: readonly ChartPoint[], actLimit: number): [number, number] {
  const lows = standing.map(({ ratio, uRatio }) => ratio - GIVE_OR_TAKE * uRatio);
  const highs = standing.map(({ ratio, uRatio }) => ratio + GIVE_OR_TAKE * uRatio);
  const lowest = Math.min(actLimit, ...lows);
  const highest = Math.max(1, ...highs);
  return [Math.max(0, lowest - HEAD_ROOM), highest + HEAD_ROOM];
}

/** The fitted line goes through the limit where it is said to reach it, at its own slope. */
function trendLine(
  { series, actLimit }: DeliveryHistory,
  standing: readonly ChartPoint[],
  trend: Known | null,
  [, end]: [number, number],
): TrendLine | null {
  const meets = trend?.reachesLimitAtHours ?? null;
  const baselineMl = series.at(-1)?.baseline?.perRunMl;
  const first = standing.find((point) => point.series === series.length - 1);
  if (!trend || meets === null || !baselineMl || !first) return null;
  const at = (atHours: number) => ({
    atHours,
    ratio: actLimit + ((atHours - meets) * trend.perHour) / baselineMl,
  });
  const last = Math.max(meets, standing.at(-1)?.atHours ?? meets);
  return { from: at(first.atHours), to: at(Math.min(last, end)), range: trend.range };
}
