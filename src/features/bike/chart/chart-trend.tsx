import type { ChartFrame } from "./chart-frame.ts";
import type { TrendLine } from "./chart-model.ts";

interface Props {
  frame: ChartFrame;
  trend: TrendLine;
  actLimit: number;
}

/** The declining line, and on the limit the stretch of hours in which it may be met. */
export function ChartTrend({ frame, trend, actLimit }: Props) {
  const { x, y } = frame;
  const { from, to, range } = trend;
  const [first = 0, last = 0] = x.domain();
  const limitY = y(actLimit);
  return (
    <g stroke="var(--oil)" strokeWidth="2.5" fill="none">
      <path d={`M${x(from.atHours)} ${y(from.ratio)}L${x(to.atHours)} ${y(to.ratio)}`} />
      {range && (
        <>
          <path d={`M${x(range.low)} ${limitY}H${x(range.high)}`} strokeWidth="9" opacity="0.35" />
          {[range.low, range.high].map(
            (hours) =>
              first <= hours &&
              hours <= last && (
                <path key={hours} d={`M${x(hours)} ${limitY - 8}v16`} strokeWidth="2" />
              ),
          )}
        </>
      )}
    </g>
  );
}
