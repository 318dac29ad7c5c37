import {
  columnFilteringFeature,
  createColumnHelper,
  createFilteredRowModel,
  createSortedRowModel,
  globalFilteringFeature,
  rowSortingFeature,
  tableFeatures,
} from "@tanstack/react-table";
import { lineUpOrder } from "../../../../shared/schemas/club.ts";
import { formatDay } from "../../../ui/format-when.ts";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import { BikeCell } from "./bike-cell.tsx";
import type { BoardRow } from "./board.ts";
import { WhatToDo } from "./what-to-do.tsx";
import { hoursLeftWords, pumpHoursWords, ratioWords, trendWords } from "./line-up-words.ts";

/** What is used of the table's library. */
export const features = tableFeatures({
  columnFilteringFeature,
  globalFilteringFeature,
  rowSortingFeature,
  filteredRowModel: createFilteredRowModel(),
  sortedRowModel: createSortedRowModel(),
});

const column = createColumnHelper<typeof features, BoardRow>();
/** What is not known comes last, whichever way a column is sorted. */
const unknownLast = { sortUndefined: "last" } as const;
const ignoringCase = (a: string, b: string) => a.localeCompare(b, "en", { sensitivity: "base" });

/** The columns, by the names that the address holds; the first sort is worst or soonest first. */
export const columns = column.columns([
  column.accessor("name", {
    id: "bike",
    header: "Bike",
    sortFn: (a, b) => ignoringCase(a.original.name, b.original.name),
    cell: ({ row }) => <BikeCell row={row.original} />,
  }),
  column.accessor((row) => row.owner.name, {
    id: "owner",
    header: "Owner",
    sortFn: (a, b) => ignoringCase(a.original.owner.name, b.original.owner.name),
  }),
  column.accessor((row) => lineUpOrder.indexOf(row.place), {
    id: "worst",
    header: "What to do",
    cell: ({ row }) => (
      <>
        <WhatToDo row={row.original} />
        <VerdictMark verdict={row.original.verdict} />
      </>
    ),
  }),
  column.accessor((row) => row.ratio ?? undefined, {
    id: "ratio",
    header: "Of baseline",
    ...unknownLast,
    cell: ({ row }) => ratioWords(row.original.ratio),
  }),
  column.accessor((row) => row.trendPerHour ?? undefined, {
    id: "trend",
    header: "Trend",
    ...unknownLast,
    cell: ({ row }) => trendWords(row.original.trendPerHour),
  }),
  column.accessor("dueInHours", {
    id: "due",
    header: "Next check",
    cell: ({ getValue }) => hoursLeftWords(getValue()),
  }),
  column.accessor((row) => row.lastCheckAt ?? "", {
    id: "checked",
    header: "Last check",
    cell: ({ getValue }) => (getValue() ? formatDay(getValue()) : "none"),
  }),
  column.accessor((row) => row.pumpHours ?? undefined, {
    id: "pump",
    header: "Pump in use",
    sortDescFirst: true,
    ...unknownLast,
    cell: ({ row }) => pumpHoursWords(row.original.pumpHours),
  }),
]);
