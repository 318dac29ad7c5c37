import { useId, type ReactNode } from "react";
import { marks, type Scale } from "./column-scale.ts";
import { columnSentence, type ColumnReading } from "./column-sentence.ts";
import { GIVE_OR_TAKE } from "./format-quantity.ts";

interface Props extends ColumnReading {
  /** The barrel's, where the syringe is known; otherwise `usualScale(…)`. */
  scale: Scale;
  size: "small" | "large";
  /** Lets the oil rise to its reading once, when a result appears. */
  fills?: boolean;
}

/** In units of the drawing: the barrel between its highest mark and zero, with its tip below. */
const frames = {
  small: { width: 64, height: 132, left: 15, right: 49, top: 14, zero: 112, most: 26, stroke: 1.5 },
  large: {
    width: 232,
    height: 348,
    left: 76,
    right: 142,
    top: 26,
    zero: 306,
    most: 101,
    stroke: 2,
  },
};
type Frame = (typeof frames)["small"];

/**
 * The measuring column: marks as the barrel has them, oil to the reading, the baseline dashed, the
 * limit solid, and the reading's uncertainty as a soft band at the meniscus.
 */
export function Column({ scale, size, fills = false, ...reading }: Props) {
  const id = useId();
  const frame = frames[size];
  const yOf = (ml: number) => {
    const share = Math.min(Math.max(ml / scale.maxMl, 0), 1.05);
    return frame.zero - share * (frame.zero - frame.top);
  };
  const { readingMl, uMl, baselineMl, limitMl } = reading;
  return (
    <svg
      role="img"
      aria-label={columnSentence(reading)}
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className={size === "small" ? "h-[8.25rem] w-16 shrink-0" : "h-auto w-full max-w-[16rem]"}
    >
      <defs>
        <clipPath id={`${id}-barrel`}>
          <path d={barrelPath(frame)} />
        </clipPath>
        <linearGradient id={`${id}-band`} x1="0" y1="0" x2="0" y2="1">
          <stop offset="0" stopColor="var(--oil)" stopOpacity="0" />
          <stop offset="0.5" stopColor="var(--oil)" stopOpacity="0.75" />
          <stop offset="1" stopColor="var(--oil)" stopOpacity="0" />
        </linearGradient>
      </defs>
      <g clipPath={`url(#${id}-barrel)`}>
        <path d={barrelPath(frame)} fill="var(--paper)" />
        {readingMl !== null && (
          <Oil
            frame={frame}
            yOf={yOf}
            readingMl={readingMl}
            uMl={uMl ?? 0}
            band={`${id}-band`}
            fills={fills}
          />
        )}
      </g>
      <Marks frame={frame} yOf={yOf} scale={scale} large={size === "large"} />
      <Barrel frame={frame} />
      {baselineMl != null && (
        <Level frame={frame} y={yOf(baselineMl)} dashed ink="var(--ink)">
          {size === "large" && (
            <Words frame={frame} y={yOf(baselineMl) - 6} word="baseline" ml={baselineMl} />
          )}
        </Level>
      )}
      {limitMl != null && (
        <Level frame={frame} y={yOf(limitMl)} ink="var(--low)">
          {size === "large" && (
            <Words frame={frame} y={yOf(limitMl) + 16} word="limit" ml={limitMl} />
          )}
        </Level>
      )}
    </svg>
  );
}

/** Straight walls, then the taper to the plugged tip. */
function barrelPath({ left, right, top, zero }: Frame): string {
  const middle = (left + right) / 2;
  const tip = (right - left) / 9;
  const taper = zero + (right - left) / 6;
  return `M${left} ${top - 10}V${zero}L${middle - tip} ${taper}H${middle + tip}L${right} ${zero}V${top - 10}Z`;
}

function Barrel({ frame }: { frame: Frame }) {
  const { left, right, top, zero, stroke } = frame;
  const middle = (left + right) / 2;
  const taper = zero + (right - left) / 6;
  const flange = (right - left) / 5;
  return (
    <g fill="none" stroke="var(--ink)" strokeWidth={stroke} strokeLinecap="round">
      <path d={barrelPath(frame).replace("Z", "")} strokeLinejoin="round" />
      <path d={`M${left - flange} ${top - 10}H${left}M${right} ${top - 10}H${right + flange}`} />
      <rect
        x={middle - flange / 2}
        y={taper}
        width={flange}
        height={flange * 0.9}
        rx="1.5"
        fill="var(--ink)"
      />
    </g>
  );
}

interface OilProps {
  frame: Frame;
  yOf: (ml: number) => number;
  readingMl: number;
  uMl: number;
  /** Id of the band's gradient. */
  band: string;
  fills: boolean;
}

function Oil({ frame, yOf, readingMl, uMl, band, fills }: OilProps) {
  const { left, right, height, stroke } = frame;
  const y = yOf(readingMl);
  const half = GIVE_OR_TAKE * uMl;
  const bandTop = yOf(readingMl + half);
  const bandHeight = yOf(Math.max(0, readingMl - half)) - bandTop;
  const width = right - left;
  return (
    <>
      <rect
        x={left}
        y={y}
        width={width}
        height={height - y}
        fill="var(--oil)"
        fillOpacity="0.5"
        className={fills ? "animate-fill" : undefined}
      />
      <rect x={left} y={bandTop} width={width} height={bandHeight} fill={`url(#${band})`} />
      <path d={`M${left} ${y}H${right}`} stroke="var(--oil)" strokeWidth={stroke * 1.5} />
    </>
  );
}

interface MarksProps {
  frame: Frame;
  yOf: (ml: number) => number;
  scale: Scale;
  large: boolean;
}

function Marks({ frame, yOf, scale, large }: MarksProps) {
  const { left, right, most } = frame;
  const width = right - left;
  return (
    <g stroke="var(--ink)" strokeWidth={large ? 1.25 : 0.75}>
      {marks(scale, most).map(({ ml, numbered }) => (
        <g key={ml}>
          <path d={`M${left} ${yOf(ml)}h${width * (numbered ? 0.4 : 0.2)}`} />
          {large && numbered && (
            <text
              x={left + width * 0.48}
              y={yOf(ml) + 4.5}
              fontSize="13"
              fill="var(--ink)"
              stroke="none"
              className="tabular-nums"
            >
              {ml}
            </text>
          )}
        </g>
      ))}
    </g>
  );
}

interface LevelProps {
  frame: Frame;
  y: number;
  ink: string;
  dashed?: boolean;
  children?: ReactNode;
}

/** A line across the barrel and a little beyond it; with words, out to their side. */
function Level({ frame, y, ink, dashed, children }: LevelProps) {
  const to = children ? frame.width - 4 : frame.right + 9;
  return (
    <g fill={ink}>
      <path
        d={`M${frame.left - 9} ${y}H${to}`}
        stroke={ink}
        strokeWidth={frame.stroke * 1.25}
        strokeDasharray={dashed ? `${frame.stroke * 3} ${frame.stroke * 2}` : undefined}
      />
      {children}
    </g>
  );
}

function Words(props: { frame: Frame; y: number; word: string; ml: number }) {
  return (
    <text x={props.frame.right + 14} y={props.y} fontSize="14">
      {props.word} <tspan fontWeight="700">{props.ml.toFixed(2)}</tspan>
    </text>
  );
}
