import { formatMlGiveOrTake, formatPercent } from "../../../ui/format-quantity.ts";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import type { HistoryPoint } from "../history/history-point.ts";

/** What a check came to. */
export function CheckReading({ point }: { point: HistoryPoint | undefined }) {
  if (!point) return <p>Nothing in it could be counted.</p>;
  const { perRunMl, uMl, ratio, verdict } = point;
  return (
    <div className="flex flex-wrap items-center gap-x-4">
      <p>
        {formatMlGiveOrTake(perRunMl, uMl)} a run
        {ratio !== null && `, ${formatPercent(ratio)} of the baseline`}
      </p>
      {verdict && <VerdictMark verdict={verdict} />}
    </div>
  );
}
