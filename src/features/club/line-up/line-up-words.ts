import {
  lineUpOrder,
  type LineUpFacts,
  type LineUpPlace,
} from "../../../../shared/schemas/club.ts";
import { formatHours } from "../../../ui/format-hours.ts";

/** As the order of the board is told, worst first. */
export const placeWords: Record<LineUpPlace, string> = {
  stop: "stop",
  repeat: "repeat before riding",
  overdue: "check overdue",
  dropping: "delivery dropping",
  "due-soon": "check due soon",
  settling: "nothing to compare with yet",
  holding: "delivery holding",
  retired: "retired",
};

export const ORDER_SENTENCE = `Worst first: ${lineUpOrder.map((place) => placeWords[place]).join(", ")}; within each, the fewest hours left.`;

/** Engine hours to the next check: `12.4 h left`, `3.2 h over`, `due now`. */
export function hoursLeftWords(dueInHours: number): string {
  const shown = formatHours(Math.abs(dueInHours));
  if (shown === formatHours(0)) return "due now";
  return `${shown}\u00a0h ${dueInHours > 0 ? "left" : "over"}`;
}

export const ratioWords = (ratio: number | null) =>
  ratio === null ? "–" : `${Math.round(100 * ratio)}\u00a0%`;

/** Engine hours over which a trend is told: in one it would hardly show. */
const TREND_HOURS = 10;

/** `−2.1 % in 10 h` of the baseline; `level` where it rounds to nothing. */
export function trendWords(trendPerHour: number | null): string {
  if (trendPerHour === null) return "–";
  const percent = (100 * TREND_HOURS * Math.abs(trendPerHour)).toFixed(1);
  if (percent === "0.0") return "level";
  return `${trendPerHour < 0 ? "−" : "+"}${percent}\u00a0% in ${TREND_HOURS}\u00a0h`;
}

export const pumpHoursWords = (hours: number | null) =>
  hours === null ? "–" : `${formatHours(hours)}\u00a0h`;

/** What has to be said of a bike beside its verdict. */
export function remarksOf(facts: LineUpFacts): string[] {
  return [
    facts.stopAdvised && "Stop advised",
    facts.verdict === "none" && "No baseline yet",
    facts.limitsTightened && "Limits tightened",
    facts.lowCheckStruck && "A low check struck",
  ].filter((remark) => remark !== false);
}
