import { useId } from "react";
import { frames } from "./column-frame.ts";
import { Barrel, Level, Marks, Oil } from "./column-parts.tsx";
import type { Scale } from "./column-scale.ts";
import { columnSentence, type ColumnReading } from "./column-sentence.ts";

interface Props extends ColumnReading {
  /** The barrel's, where the syringe is known; otherwise `usualScale(…)`. */
  scale: Scale;
  size: keyof typeof frames;
  /** Lets the oil rise to its reading once, when a result appears. */
  fills?: boolean;
}

/**
 * The measuring column: marks as the barrel has them, oil to the reading, the baseline dashed, the
 * limit solid, and the reading's uncertainty as a soft band at the meniscus.
 */
export function Column({ scale, size, fills = false, ...reading }: Props) {
  const id = useId();
  const frame = frames[size];
  /** A volume's height; what is over the barrel stands just above its highest mark. */
  const yOf = (ml: number) => {
    const share = Math.min(Math.max(ml / scale.maxMl, 0), 1.03);
    return frame.zero - share * (frame.zero - frame.top);
  };
  const { readingMl, uMl, baselineMl, limitMl } = reading;
  return (
    <svg
      role="img"
      aria-label={columnSentence(reading)}
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className={size === "small" ? "h-[152px] w-[72px] shrink-0" : "h-auto w-full max-w-[16rem]"}
    >
      {readingMl !== null && (
        <Oil id={id} frame={frame} yOf={yOf} ml={readingMl} uMl={uMl ?? 0} fills={fills} />
      )}
      <Marks frame={frame} yOf={yOf} scale={scale} />
      <Barrel frame={frame} />
      {baselineMl != null && (
        <Level frame={frame} y={yOf(baselineMl)} word="baseline" ml={baselineMl} />
      )}
      {limitMl != null && <Level frame={frame} y={yOf(limitMl)} word="limit" ml={limitMl} />}
    </svg>
  );
}
