import { formatPercent } from "../../../ui/format-quantity.ts";
import type { ChartFrame } from "./chart-frame.ts";
import type { ChartModel } from "./chart-model.ts";
import { levelLooks } from "./level-looks.ts";

interface Props {
  frame: ChartFrame;
  model: ChartModel;
}

/** The plot's paper: scales, what lies below the limit, the baseline and both limits. */
export function ChartGround({ frame, model }: Props) {
  const { plot, x, y, hourTicks, ratioTicks, fontPx } = frame;
  const { left, right, top, bottom } = plot;
  const limitY = y(model.actLimit);
  return (
    <g fontSize={fontPx} fill="var(--ink)">
      <rect
        x={left}
        y={limitY}
        width={right - left}
        height={Math.max(0, bottom - limitY)}
        fill="var(--low)"
        opacity={0.07}
      />
      <g stroke="var(--rule)">
        {ratioTicks.map((ratio) => (
          <path key={ratio} d={`M${left} ${y(ratio)}H${right}`} />
        ))}
      </g>
      {ratioTicks.map((ratio) => (
        <text key={ratio} x={left - 0.5 * fontPx} y={y(ratio) + 0.35 * fontPx} textAnchor="end">
          {formatPercent(ratio)}
        </text>
      ))}
      {hourTicks.map((hours) => (
        <g key={hours}>
          <path d={`M${x(hours)} ${bottom}v5`} stroke="var(--ink)" />
          <text x={x(hours)} y={bottom + 1.5 * fontPx} textAnchor="middle">
            {hours}
          </text>
        </g>
      ))}
      <text x={right} y={bottom + 2.8 * fontPx} textAnchor="end" opacity={0.8}>
        engine hours
      </text>
      <path d={`M${left} ${top}V${bottom}H${right}`} fill="none" stroke="var(--ink)" />
      <LevelLine frame={frame} ratio={1} {...levelLooks.baseline} />
      <LevelLine frame={frame} ratio={model.watchLimit} {...levelLooks.watch} />
      <LevelLine frame={frame} ratio={model.actLimit} {...levelLooks.act} />
    </g>
  );
}

interface LineProps {
  frame: ChartFrame;
  ratio: number;
  ink: string;
  dashes?: string;
}

function LevelLine({ frame, ratio, ink, dashes }: LineProps) {
  const { left, right } = frame.plot;
  const y = frame.y(ratio);
  return (
    <path d={`M${left} ${y}H${right}`} stroke={ink} strokeWidth="1.75" strokeDasharray={dashes} />
  );
}
