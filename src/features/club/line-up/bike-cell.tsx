import { Link } from "react-router-dom";
import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { bikePath } from "../../../ui/paths.ts";
import type { BoardRow } from "./board.ts";
import { Remarks } from "./remarks.tsx";

/** Which bike, the way to it, and what has to be said of it. */
export function BikeCell({ row }: { row: BoardRow }) {
  return (
    <>
      <Link
        to={bikePath(row.bikeId)}
        className="-mt-3 inline-flex min-h-target min-w-target items-center text-lg leading-tight font-bold text-oil wrap-anywhere"
      >
        {row.name}
      </Link>
      <p className="-mt-2 text-soft">
        Tag <span className="tracking-wider">{row.tag}</span>
      </p>
      <Remarks row={row} />
      {row.unsent > 0 && <EntryStateMark state="saved" />}
    </>
  );
}
