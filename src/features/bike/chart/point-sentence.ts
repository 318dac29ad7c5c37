import type { MeterFormat } from "../../../../shared/schemas/entry.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatMlGiveOrTake, formatPercent, GIVE_OR_TAKE } from "../../../ui/format-quantity.ts";
import { formatDay } from "../../../ui/format-when.ts";
import { verdictWords } from "../../../ui/words.ts";
import type { ChartPoint } from "./chart-model.ts";

/** What a point of the chart says. */
export function pointSentence(point: ChartPoint, meterFormat: MeterFormat): string {
  const { atHours, at, perRunMl, uMl, ratio, uRatio, verdict } = point;
  const when = `${formatHours(atHours, meterFormat)}\u00a0h, ${formatDay(at)}`;
  const share = `${formatPercent(ratio)} ± ${formatPercent(GIVE_OR_TAKE * uRatio)} of the baseline`;
  const stands = verdict ? verdictWords[verdict] : "Struck, not counted";
  return `${when}: ${share}, ${formatMlGiveOrTake(perRunMl, uMl)} a run. ${stands}.`;
}
