import { line } from "d3-shape";
import { GIVE_OR_TAKE } from "../../../ui/format-quantity.ts";
import type { ChartFrame } from "./chart-frame.ts";
import type { ChartModel, ChartPoint } from "./chart-model.ts";
import { PointMark } from "./point-mark.tsx";

interface Props {
  frame: ChartFrame;
  model: ChartModel;
  chosen: ChartPoint;
}

/** The checks, joined within their series, each with its error bar. */
export function ChartPoints({ frame, model, chosen }: Props) {
  const { x, y } = frame;
  const join = line<ChartPoint>(
    (point) => x(point.atHours),
    (point) => y(point.ratio),
  );
  return (
    <g>
      {seriesOf(model.points).map((points, index) => (
        <path
          key={index}
          d={join(points) ?? ""}
          fill="none"
          stroke="var(--ink)"
          strokeWidth="1.25"
          opacity="0.45"
        />
      ))}
      {model.points.map((point) => (
        <ErrorBar key={point.entryId} frame={frame} point={point} />
      ))}
      <circle
        cx={x(chosen.atHours)}
        cy={y(chosen.ratio)}
        r={13}
        fill="none"
        stroke="var(--oil)"
        strokeWidth="3"
      />
      {model.points.map((point) => (
        <g key={point.entryId} transform={`translate(${x(point.atHours)} ${y(point.ratio)})`}>
          <PointMark verdict={point.verdict} />
        </g>
      ))}
    </g>
  );
}

/** The standing checks of each series: a struck one joins nothing. */
function seriesOf(points: readonly ChartPoint[]): ChartPoint[][] {
  const series: ChartPoint[][] = [];
  for (const point of points) if (point.verdict) (series[point.series] ??= []).push(point);
  return series.filter(Boolean);
}

function ErrorBar({ frame, point }: { frame: ChartFrame; point: ChartPoint }) {
  const reach = GIVE_OR_TAKE * point.uRatio;
  const x = frame.x(point.atHours);
  const high = frame.y(point.ratio + reach);
  const low = frame.y(point.ratio - reach);
  return (
    <path
      d={`M${x - 4} ${high}h8m-4 0V${low}m-4 0h8`}
      fill="none"
      stroke="var(--ink)"
      strokeWidth="1.5"
      opacity={point.verdict ? 0.8 : 0.4}
      strokeDasharray={point.verdict ? undefined : "3 3"}
    />
  );
}
