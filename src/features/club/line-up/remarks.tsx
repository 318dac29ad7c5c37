import { CautionIcon } from "../../../ui/icons.tsx";
import type { BoardRow } from "./board.ts";
import { remarksOf } from "./line-up-words.ts";

export function Remarks({ row }: { row: BoardRow }) {
  const remarks = remarksOf(row);
  if (remarks.length === 0) return null;
  return (
    <ul className="flex flex-wrap gap-x-4">
      {remarks.map((remark) => (
        <li key={remark} className="flex items-center gap-1">
          <CautionIcon className="size-4 shrink-0 text-dropping" />
          {remark}
        </li>
      ))}
    </ul>
  );
}
