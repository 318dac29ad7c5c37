import { Link } from "react-router-dom";
import { formatMlGiveOrTake, formatPercent } from "../../../ui/format-quantity.ts";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import type { HistoryPoint } from "../history/history-point.ts";

interface Props {
  point: HistoryPoint | undefined;
  /** Null where there is no result to show. */
  resultPath: string | null;
}

/** What a check came to, and the way to all that it says. */
export function CheckReading({ point, resultPath }: Props) {
  if (!point) return <p>Nothing in it could be counted.</p>;
  const { perRunMl, uMl, ratio, verdict } = point;
  return (
    <>
      <p>
        {formatMlGiveOrTake(perRunMl, uMl)} a run
        {ratio !== null && `, ${formatPercent(ratio)} of the baseline`}
      </p>
      <div className="flex flex-wrap items-center justify-between gap-x-4">
        {verdict && <VerdictMark verdict={verdict} />}
        {resultPath && (
          <Link to={resultPath} className="flex min-h-target items-center font-bold text-oil">
            Result
          </Link>
        )}
      </div>
    </>
  );
}
