import type { BikeRecord } from "../../offline/index.ts";
import { formatHours } from "../../ui/format-hours.ts";
import { formatDate } from "../../ui/format-when.ts";

/** Engine hours to the next check, or over it: the largest thing on the screen. */
export function HoursLeft({ bike }: { bike: BikeRecord }) {
  const { due, checks } = bike.summary;
  const { meterFormat } = bike.details;
  const shown = formatHours(Math.abs(due.inHours), meterFormat);
  const isNow = shown === formatHours(0, meterFormat);
  const check = checks.length === 0 ? "first check" : "check";
  const isAhead = !isNow && !due.overdue;
  return (
    <p className="leading-tight">
      <span className="flex flex-wrap items-baseline gap-x-2 font-bold">
        <span className={`tabular-nums ${shown.length > 5 ? "text-figure-long" : "text-figure"}`}>
          {isNow ? "Now" : shown}
        </span>
        {!isNow && <span className="text-2xl"> {due.overdue ? "h over" : "h"}</span>}
      </span>{" "}
      {isAhead ? `to the ${check === "check" ? "next check" : check}` : `${check} is due`}
      {isAhead && due.onDate && (
        <span className="block text-soft">about {formatDate(due.onDate)}</span>
      )}
    </p>
  );
}
