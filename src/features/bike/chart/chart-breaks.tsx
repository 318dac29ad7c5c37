import type { ChartFrame } from "./chart-frame.ts";

/** Where a new baseline series began, and why. */
export function ChartBreaks({ frame }: { frame: ChartFrame }) {
  const { breakLabels, plot, fontPx } = frame;
  return (
    <g fontSize={fontPx} fill="var(--ink)">
      {breakLabels.map((label, index) => (
        <g key={index}>
          <path
            d={`M${label.lineX} ${label.y + 0.35 * fontPx}V${plot.bottom}`}
            stroke="var(--ink)"
            strokeWidth="1.25"
          />
          <text
            x={label.x}
            y={label.y}
            textAnchor={label.anchor}
            stroke="var(--paper)"
            strokeWidth="4"
            paintOrder="stroke"
          >
            {label.text}
          </text>
        </g>
      ))}
    </g>
  );
}
