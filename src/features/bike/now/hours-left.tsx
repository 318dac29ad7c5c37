import type { BikeRecord } from "../../../offline/index.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatDate } from "../../../ui/format-when.ts";

function words(inHours: number): string {
  if (inHours === 0) return "is the time for a check";
  return inHours > 0 ? "to the next check" : "over: check before the next ride";
}

/** Engine hours to the next check, why, and about when. */
export function HoursLeft({ record }: { record: BikeRecord }) {
  const { due } = record.summary;
  const hours = formatHours(Math.abs(due.inHours), record.details.meterFormat);
  const now = hours === formatHours(0, record.details.meterFormat);
  return (
    <div>
      <p className="leading-tight">
        <span className="block text-figure font-bold tabular-nums">
          {now ? "Now" : `${hours}\u00a0h`}
        </span>
        <span className="text-xl font-bold">{words(now ? 0 : due.inHours)}</span>
      </p>
      <p className="mt-1">
        {due.reason}
        {due.onDate && due.inHours > 0 && ` Likely about ${formatDate(due.onDate)}.`}
      </p>
    </div>
  );
}
