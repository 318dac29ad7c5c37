import { symbol, symbolCircle, symbolDiamond, symbolTriangle, symbolTimes } from "d3-shape";
import type { Verdict } from "../../../../shared/schemas/entry.ts";

const AREA = 90;
const path = (type: typeof symbolCircle, area = AREA) => symbol(type, area)() ?? "";

/** A shape for each verdict, readable without its colour; a struck check is hollow. */
const marks = {
  struck: { d: path(symbolCircle), fill: "var(--card)", stroke: "var(--ink)" },
  none: { d: path(symbolCircle), fill: "var(--card)", stroke: "var(--ink)" },
  settling: { d: path(symbolDiamond), fill: "var(--ink)", stroke: "var(--card)" },
  holding: { d: path(symbolCircle), fill: "var(--holding)", stroke: "var(--card)" },
  dropping: { d: path(symbolTriangle), fill: "var(--dropping)", stroke: "var(--card)" },
  low: { d: path(symbolTimes, 110), fill: "none", stroke: "var(--low)" },
} satisfies Record<Verdict | "struck", { d: string; fill: string; stroke: string }>;

/** The mark of a check; `verdict` is null where it was struck. */
export function PointMark({ verdict }: { verdict: Verdict | null }) {
  const { d, fill, stroke } = marks[verdict ?? "struck"];
  return (
    <path
      d={d}
      fill={fill}
      stroke={stroke}
      strokeWidth={verdict === "low" ? 3.5 : 1.5}
      strokeLinecap="round"
      transform={verdict === "dropping" ? "rotate(180)" : undefined}
    />
  );
}
