import type { ReactNode } from "react";
import type { BikeRecord } from "../../../offline/index.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatDay } from "../../../ui/format-when.ts";

/** What the meter shows, what that is over the bike's life, and how much it is ridden. */
export function HoursNow({ record }: { record: BikeRecord }) {
  const { now, readAt, displayOffset, perWeek } = record.summary.hours;
  const { meterFormat, meter } = record.details;
  if (now === null) return <p>No engine hours logged yet.</p>;
  const show = (hours: number) => `${formatHours(hours, meterFormat)}\u00a0h`;
  return (
    <dl className="flex flex-wrap gap-x-8 gap-y-3">
      <Figure name={meter === "estimated" ? "Engine hours, estimated" : "The meter shows"}>
        {show(now - displayOffset)}
        {readAt && <span className="block text-base font-normal">on {formatDay(readAt)}</span>}
      </Figure>
      {displayOffset !== 0 && <Figure name="Over the bike's life">{show(now)}</Figure>}
      {perWeek !== null && <Figure name="Ridden a week">{perWeek.toFixed(1)}&nbsp;h</Figure>}
    </dl>
  );
}

function Figure({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div>
      <dt className="text-soft">{name}</dt>
      <dd className="text-2xl leading-tight font-bold tabular-nums">{children}</dd>
    </div>
  );
}
