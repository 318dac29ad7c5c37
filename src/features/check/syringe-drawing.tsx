import { Eye } from "lucide-react";
import { useId } from "react";
import type { Syringe } from "../../../shared/schemas/entry.ts";
import { type Frame } from "../../ui/column-frame.ts";
import { Barrel, Marks, Oil } from "../../ui/column-parts.tsx";
import { formatMl } from "../../ui/format-quantity.ts";

const frame: Frame = {
  width: 190,
  height: 400,
  left: 58,
  right: 138,
  top: 22,
  zero: 356,
  stroke: 2,
  mostMarks: 101,
  large: true,
};
/** The plunger may have been past the last mark: the oil then stands just above it. */
const HIGHEST_SHARE = 1.03;

interface Props {
  syringe: Pick<Syringe, "capacityMl" | "graduationMl">;
  levelMl: number | null;
  startMl?: number | null;
  /** Draws the eye at the level, as it must be held. */
  eye?: boolean;
  /** A tap at a height, mL; buttons beside the drawing do the same. */
  onPick?: (ml: number) => void;
  className?: string;
}

/** The rider's own syringe: its marks, the oil in it, and where it stood before the run. */
export function SyringeDrawing({ syringe, levelMl, startMl, eye, onPick, className }: Props) {
  const id = useId();
  const { capacityMl } = syringe;
  const yOf = (ml: number) =>
    frame.zero - Math.min(ml / capacityMl, HIGHEST_SHARE) * (frame.zero - frame.top);
  const shown = levelMl ?? startMl ?? null;
  const pick = (svg: SVGSVGElement, clientY: number) => {
    const toDrawing = svg.getScreenCTM()?.inverse();
    if (!toDrawing || !onPick) return;
    const { y } = new DOMPoint(0, clientY).matrixTransform(toDrawing);
    const share = (frame.zero - y) / (frame.zero - frame.top);
    onPick(Math.min(Math.max(share, 0), 1) * capacityMl);
  };
  return (
    <svg
      role="img"
      aria-label={sentence(syringe, levelMl, startMl ?? null)}
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className={`${className ?? ""} ${onPick ? "cursor-pointer" : ""}`}
      onClick={onPick && ((event) => pick(event.currentTarget, event.clientY))}
    >
      {shown !== null && <Oil id={id} frame={frame} yOf={yOf} ml={shown} uMl={0} fills={false} />}
      <Marks
        frame={frame}
        yOf={yOf}
        scale={{ maxMl: capacityMl, graduationMl: syringe.graduationMl }}
      />
      <Barrel frame={frame} />
      {startMl != null && <StartLevel y={yOf(startMl)} />}
      {eye && shown !== null && <EyeLine y={yOf(shown)} />}
    </svg>
  );
}

function StartLevel({ y }: { y: number }) {
  return (
    <>
      <path d={`M${frame.left - 14} ${y}h14`} stroke="var(--ink)" strokeWidth="2.5" />
      <text x={frame.left - 18} y={y + 5} textAnchor="end" fontSize="16" fill="var(--ink)">
        start
      </text>
    </>
  );
}

function EyeLine({ y }: { y: number }) {
  return (
    <g stroke="var(--ink)">
      <path
        d={`M${frame.right + 4} ${y}H${frame.width - 28}`}
        strokeWidth="2"
        strokeDasharray="5 4"
      />
      <Eye x={frame.width - 26} y={y - 13} width="26" height="26" aria-hidden />
    </g>
  );
}

function sentence(
  { capacityMl, graduationMl }: Props["syringe"],
  levelMl: number | null,
  startMl: number | null,
): string {
  const barrel = `A ${capacityMl} mL barrel with marks each ${graduationMl} mL`;
  const start = startMl === null ? "" : `, oil at ${formatMl(startMl)} before the run`;
  const level = levelMl === null ? "" : `, at ${formatMl(levelMl)} now`;
  return `${barrel}${start}${level}.`;
}
