import type { Row } from "@tanstack/react-table";
import { Link } from "react-router-dom";
import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { formatDay } from "../../../ui/format-when.ts";
import { bikePath } from "../../../ui/paths.ts";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import type { BoardRow } from "./board.ts";
import type { features } from "./columns.tsx";
import { hoursLeftWords, pumpHoursWords, ratioWords, trendWords } from "./line-up-words.ts";
import { Remarks } from "./remarks.tsx";
import { WhatToDo } from "./what-to-do.tsx";

/** The board on a phone. */
export function LineUpCards({ rows }: { rows: Row<typeof features, BoardRow>[] }) {
  return (
    <ol className="divide-y divide-rule border-y border-rule">
      {rows.map(({ id, original }) => (
        <li key={id}>
          <BikeLine row={original} />
        </li>
      ))}
    </ol>
  );
}

function BikeLine({ row }: { row: BoardRow }) {
  return (
    <Link to={bikePath(row.bikeId)} className="flex flex-col gap-1 py-3">
      <span className="flex flex-wrap items-baseline justify-between gap-x-4">
        <strong className="text-xl leading-tight wrap-anywhere">{row.name}</strong>
        <strong className="text-xl leading-tight tabular-nums">
          {hoursLeftWords(row.dueInHours)}
        </strong>
      </span>
      <WhatToDo row={row} />
      <span className="flex flex-wrap items-center gap-x-4">
        <VerdictMark verdict={row.verdict} />
        {row.ratio !== null && (
          <span className="tabular-nums">{ratioWords(row.ratio)} of baseline</span>
        )}
      </span>
      <Remarks row={row} />
      <span className="text-soft">{smallPrint(row)}</span>
      {row.unsent > 0 && <EntryStateMark state="saved" />}
    </Link>
  );
}

/** `Wren · 7KMX4P · −2.1 % in 10 h · checked 1 Dec 2026 · pump in use 120.0 h` */
function smallPrint({ owner, tag, trendPerHour, lastCheckAt, pumpHours }: BoardRow): string {
  return [
    owner.name,
    tag,
    trendPerHour !== null && trendWords(trendPerHour),
    lastCheckAt ? `checked ${formatDay(lastCheckAt)}` : "never checked",
    pumpHours !== null && `pump in use ${pumpHoursWords(pumpHours)}`,
  ]
    .filter(Boolean)
    .join(" · ");
}
