import type { Syringe } from "../../offline/index.ts";
import type { Frame } from "../../ui/column-frame.ts";
import { Barrel, Marks } from "../../ui/column-parts.tsx";

/** The inside of a 5 mL barrel as drawn, px; other barrels have the same proportions. */
const USUAL_ML = 5;
const USUAL_LENGTH = 84;
const USUAL_BORE = 28;
/** Below and above these a barrel could not be made out, or would not fit. */
const LEAST_SCALE = 0.6;
const MOST_SCALE = 1.8;
/** Marks closer than this run together, px. */
const LEAST_STEP = 2;

/** A barrel drawn to scale beside the others: twice as long holds eight times as much. */
export function SyringePicture({ syringe }: { syringe: Syringe }) {
  const { capacityMl, graduationMl } = syringe;
  const frame = frameOf(capacityMl);
  const yOf = (ml: number) => frame.zero - (ml / capacityMl) * (frame.zero - frame.top);
  return (
    <svg
      aria-hidden
      width={frame.width}
      height={frame.height}
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className="max-w-[30%] shrink-0"
    >
      <Marks frame={frame} yOf={yOf} scale={{ maxMl: capacityMl, graduationMl }} />
      <Barrel frame={frame} />
    </svg>
  );
}

function frameOf(capacityMl: number): Frame {
  const scale = Math.min(MOST_SCALE, Math.max(LEAST_SCALE, Math.cbrt(capacityMl / USUAL_ML)));
  const length = USUAL_LENGTH * scale;
  const bore = USUAL_BORE * scale;
  const flange = bore / 5;
  return {
    width: bore + 2 * flange + 4,
    height: length + 14 + bore / 2.5,
    left: flange + 2,
    right: flange + 2 + bore,
    top: 12,
    zero: 12 + length,
    stroke: 1.5,
    mostMarks: Math.floor(length / LEAST_STEP),
    large: false,
  };
}
