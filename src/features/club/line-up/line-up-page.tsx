import { useState } from "react";
import { Link } from "react-router-dom";
import type { Club } from "../../../../shared/schemas/club.ts";
import { Button } from "../../../ui/button.tsx";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { formatSince } from "../../../ui/format-when.ts";
import { Page } from "../../../ui/page.tsx";
import { membersPath, patterns, testDayPath } from "../../../ui/paths.ts";
import { AnswerNotice } from "../answer-notice.tsx";
import { LineUpCards } from "./line-up-cards.tsx";
import { LineUpTable } from "./line-up-table.tsx";
import { ORDER_SENTENCE } from "./line-up-words.ts";
import { useBoard } from "./use-board.ts";
import { useBoardTable } from "./use-board-table.ts";
import { useView } from "./use-view.ts";
import { useWideScreen } from "./use-wide-screen.ts";
import { ViewFields } from "./view-fields.tsx";

/** A long board is drawn a page at a time. */
const PAGE_ROWS = 50;

/** The bikes that members share with the club, for its mechanics: the worst first. */
export function LineUpPage({ club }: { club: Club }) {
  const { answer, rows } = useBoard(club.id);
  const [view, setView] = useView();
  const table = useBoardTable(rows, view, setView);
  const wide = useWideScreen();
  const [shown, setShown] = useState(PAGE_ROWS);
  const found = table.getRowModel().rows;
  const page = found.slice(0, shown);
  return (
    <Page
      title="Line-up"
      back={{ to: patterns.clubs, label: "Clubs" }}
      wide
      action={
        <ButtonLink look="primary" wide to={testDayPath(club.id)}>
          Test day
        </ButtonLink>
      }
    >
      <div className="-mt-3 flex flex-wrap items-center gap-x-5">
        <p className="text-lg wrap-anywhere">{club.name}</p>
        <Link
          to={membersPath(club.id)}
          className="flex min-h-target items-center font-bold text-oil"
        >
          Members
        </Link>
      </div>
      <AnswerNotice answer={answer} />
      {answer.data?.length === 0 && <NothingShared />}
      {rows.length > 0 && (
        <>
          <ViewFields view={view} onView={setView} wide={wide} />
          <p className="text-soft">
            <span role="status">{countWords(found.length, rows.length)}</span>, as of{" "}
            {formatSince(new Date(answer.dataUpdatedAt).toISOString())}.{" "}
            {wide && view.order === "worst" && ORDER_SENTENCE}
          </p>
          {wide ? <LineUpTable table={table} rows={page} /> : <LineUpCards rows={page} />}
        </>
      )}
      {found.length > shown && (
        <Button onClick={() => setShown(shown + PAGE_ROWS)}>
          Show more ({found.length - shown})
        </Button>
      )}
    </Page>
  );
}

const countWords = (found: number, all: number) =>
  found === all ? `${all} ${all === 1 ? "bike" : "bikes"}` : `${found} of ${all} bikes`;

function NothingShared() {
  return (
    <p className="text-lg">
      No bike is shared with the club yet. Each rider shares their own, on the bike’s page under
      “Share with a club”.
    </p>
  );
}
