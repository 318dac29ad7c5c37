import { useTable } from "@tanstack/react-table";
import type { BoardRow } from "./board.ts";
import { columns, features } from "./columns.tsx";
import { isFoundBy, shows } from "./line-up-views.ts";
import type { View } from "./use-view.ts";

/** The board in the order and with the bikes that are looked at. */
export function useBoardTable(
  rows: BoardRow[],
  view: View,
  onView: (change: Partial<View>) => void,
) {
  const { find, show, order, descending } = view;
  // The board comes in its own order: sorting by it could only lose the hours within a place.
  const sorting = order === "worst" && !descending ? [] : [{ id: order, desc: descending }];
  return useTable({
    features,
    columns,
    data: rows,
    getRowId: ({ bikeId }) => bikeId,
    sortDescFirst: false,
    enableMultiSort: false,
    state: { sorting, globalFilter: { find, show } },
    onSortingChange: (update) => {
      const [first] = typeof update === "function" ? update(sorting) : update;
      onView({ order: first?.id ?? "worst", descending: first?.desc ?? false });
    },
    getColumnCanGlobalFilter: ({ id }) => id === "bike",
    globalFilterFn: ({ original }) =>
      shows[show].has(original) && isFoundBy({ ...original, owner: original.owner.name }, find),
  });
}

export type BoardTable = ReturnType<typeof useBoardTable>;
