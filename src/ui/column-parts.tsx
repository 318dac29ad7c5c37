import { barrelPath, NECK, type Frame } from "./column-frame.ts";
import { marks, type Scale } from "./column-scale.ts";
import { GIVE_OR_TAKE } from "./format-quantity.ts";

interface Drawn {
  frame: Frame;
  yOf: (ml: number) => number;
}

interface OilProps extends Drawn {
  /** Makes the gradients' names the page's only ones. */
  id: string;
  ml: number;
  uMl: number;
  fills: boolean;
}

/** Oil in glass: darker towards the walls, a firm line at the level, the band of doubt about it. */
export function Oil({ id, frame, yOf, ml, uMl, fills }: OilProps) {
  const { left, right, height, stroke } = frame;
  const width = right - left;
  const bandTop = yOf(ml + GIVE_OR_TAKE * uMl);
  const bandBottom = yOf(Math.max(0, ml - GIVE_OR_TAKE * uMl));
  const y = yOf(ml);
  return (
    <>
      <defs>
        <clipPath id={`${id}-barrel`}>
          <path d={barrelPath(frame)} />
        </clipPath>
        <Fade id={`${id}-glass`} along="x" ink="var(--honey)" stops={[1, 0.72, 0.95]} />
        <Fade id={`${id}-band`} along="y" ink="var(--oil)" stops={[0, 0.8, 0]} />
      </defs>
      <g clipPath={`url(#${id}-barrel)`}>
        <rect
          x={left}
          y={y}
          width={width}
          height={height - y}
          fill={`url(#${id}-glass)`}
          className={fills ? "animate-fill" : undefined}
        />
        <rect
          x={left}
          y={bandTop}
          width={width}
          height={bandBottom - bandTop}
          fill={`url(#${id}-band)`}
        />
        <path d={`M${left} ${y}H${right}`} stroke="var(--oil)" strokeWidth={stroke * 1.5} />
      </g>
    </>
  );
}

interface FadeProps {
  id: string;
  along: "x" | "y";
  ink: string;
  /** Opacities, evenly spaced. */
  stops: number[];
}

function Fade({ id, along, ink, stops }: FadeProps) {
  return (
    <linearGradient id={id} x1="0" y1="0" x2={along === "x" ? 1 : 0} y2={along === "y" ? 1 : 0}>
      {stops.map((opacity, index) => (
        <stop
          key={index}
          offset={index / (stops.length - 1)}
          stopColor={ink}
          stopOpacity={opacity}
        />
      ))}
    </linearGradient>
  );
}

export function Marks({ frame, yOf, scale }: Drawn & { scale: Scale }) {
  const { left, right, mostMarks, large } = frame;
  const width = right - left;
  return (
    <g stroke="var(--ink)" strokeWidth={large ? 1.25 : 0.75}>
      {marks(scale, mostMarks).map(({ ml, numbered }) => (
        <g key={ml}>
          <path d={`M${left} ${yOf(ml)}h${width * (numbered ? 0.4 : 0.2)}`} />
          {large && numbered && (
            <text
              x={left + width * 0.5}
              y={yOf(ml) + 5}
              fontSize="14"
              fill="var(--ink)"
              stroke="none"
            >
              {ml}
            </text>
          )}
        </g>
      ))}
    </g>
  );
}

/** The glass, its flange, and the plug in its tip. */
export function Barrel({ frame }: { frame: Frame }) {
  const { left, right, top, zero, stroke } = frame;
  const flange = (right - left) / 5;
  return (
    <g fill="none" stroke="var(--ink)" strokeWidth={stroke} strokeLinejoin="round">
      <path d={barrelPath(frame)} />
      <path d={`M${left - flange} ${top - NECK}h${flange}M${right} ${top - NECK}h${flange}`} />
      <rect
        x={(left + right - flange) / 2}
        y={zero + (right - left) / 6}
        width={flange}
        height={flange * 0.9}
        rx="1.5"
        fill="var(--ink)"
      />
    </g>
  );
}

const levels = {
  baseline: { ink: "var(--ink)", dashed: true, below: -6 },
  limit: { ink: "var(--low)", dashed: false, below: 17 },
};

interface LevelProps {
  frame: Frame;
  y: number;
  word: keyof typeof levels;
  ml: number;
}

/** A line across the barrel and beyond; its words stand above the baseline and below the limit. */
export function Level({ frame, y, word, ml }: LevelProps) {
  const { left, right, width, stroke, large } = frame;
  const { ink, dashed, below } = levels[word];
  return (
    <>
      <path
        d={`M${left - 9} ${y}H${large ? width - 2 : right + 9}`}
        stroke={ink}
        strokeWidth={stroke * 1.25}
        strokeDasharray={dashed ? `${stroke * 3} ${stroke * 2}` : undefined}
      />
      {large && (
        <text x={right + 14} y={y + below} fontSize="15" fill={ink}>
          {word} <tspan fontWeight="700">{ml.toFixed(2)}</tspan>
        </text>
      )}
    </>
  );
}
