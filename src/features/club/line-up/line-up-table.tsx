import { FlexRender, type Header, type Row } from "@tanstack/react-table";
import type { BoardRow } from "./board.ts";
import type { features } from "./columns.tsx";
import { DownIcon } from "../../../ui/icons.tsx";
import type { BoardTable } from "./use-board-table.ts";

type Features = typeof features;

interface Props {
  table: BoardTable;
  rows: Row<Features, BoardRow>[];
}

/** The board on a wide screen: every figure in its column, each heading a way to sort. */
export function LineUpTable({ table, rows }: Props) {
  return (
    <table className="w-full border-collapse text-left [overflow-wrap:normal]">
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => (
              <HeaderCell key={header.id} header={header} />
            ))}
          </tr>
        ))}
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="border-t border-rule">
            {row.getAllCells().map((cell) => {
              const Cell = cell.column.id === "bike" ? "th" : "td";
              return (
                <Cell
                  key={cell.id}
                  scope={Cell === "th" ? "row" : undefined}
                  className={`py-2 pr-4 align-top font-normal tabular-nums ${mayWrap(cell.column.id)}`}
                >
                  <FlexRender cell={cell} />
                </Cell>
              );
            })}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** Names and words may break; figures and dates are read in one line. */
const mayWrap = (columnId: string) =>
  ["bike", "owner", "worst"].includes(columnId) ? "" : "whitespace-nowrap";

function HeaderCell({ header }: { header: Header<Features, BoardRow> }) {
  const sorted = header.column.getIsSorted();
  return (
    <th
      scope="col"
      aria-sort={sorted ? (sorted === "asc" ? "ascending" : "descending") : undefined}
      className="pr-4 align-bottom"
    >
      <button
        type="button"
        onClick={header.column.getToggleSortingHandler()}
        className="flex min-h-target min-w-target items-center gap-1 text-left leading-tight font-bold text-oil"
      >
        <FlexRender header={header} />
        {sorted && (
          <DownIcon className={`size-4 shrink-0 ${sorted === "asc" ? "rotate-180" : ""}`} />
        )}
      </button>
    </th>
  );
}
