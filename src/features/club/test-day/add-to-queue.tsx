import { useState } from "react";
import type { Club } from "../../../../shared/schemas/club.ts";
import { fetchBikes } from "../../../offline/index.ts";
import { changeTestDay, type TestDay } from "../../../offline/test-day.ts";
import { Button } from "../../../ui/button.tsx";
import { PlusIcon } from "../../../ui/icons.tsx";
import { TextField } from "../../../ui/text-field.tsx";
import { AnswerNotice } from "../answer-notice.tsx";
import type { BoardRow } from "../line-up/board.ts";
import { isFoundBy } from "../line-up/line-up-views.ts";
import { hoursLeftWords } from "../line-up/line-up-words.ts";
import { useBoard } from "../line-up/use-board.ts";
import { addBikes } from "./queue.ts";

/** More are found by typing on. */
const MOST_OFFERED = 8;

/** Bikes of the Line-up, worst first, to be put in the queue: picked, found, or by their tag. */
export function AddToQueue({ club, testDay }: { club: Club; testDay: TestDay }) {
  const { answer, rows } = useBoard(club.id);
  const [find, setFind] = useState("");
  const queued = new Set(testDay.bikes.map(({ bikeId }) => bikeId));
  const offered = rows.filter(
    (row) =>
      row.place !== "retired" &&
      !queued.has(row.bikeId) &&
      isFoundBy({ ...row, owner: row.owner.name }, find),
  );
  const add = (added: BoardRow[]) => {
    void changeTestDay(club.id, (now) => addBikes(now, added));
    void fetchBikes(added.map(({ bikeId }) => bikeId));
    setFind("");
  };
  return (
    <section aria-labelledby="add" className="flex flex-col gap-3">
      <h2 id="add" className="text-2xl">
        Add bikes
      </h2>
      <AnswerNotice answer={answer} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          if (offered.length === 1) add(offered);
        }}
      >
        <TextField
          label="Find"
          placeholder="Bike, owner or tag"
          type="search"
          autoComplete="off"
          autoCapitalize="none"
          enterKeyHint="go"
          value={find}
          onChange={(event) => setFind(event.target.value)}
        />
      </form>
      <ul className="divide-y divide-rule border-y border-rule empty:hidden">
        {offered.slice(0, MOST_OFFERED).map((row) => (
          <li key={row.bikeId}>
            <Offer row={row} onAdd={() => add([row])} />
          </li>
        ))}
      </ul>
      <p role="status" className="text-soft">
        {offeredWords(offered.length, find, rows.length)}
      </p>
      {offered.length > 1 && (
        <Button onClick={() => add(offered)}>Add all {offered.length} of them</Button>
      )}
    </section>
  );
}

function Offer({ row, onAdd }: { row: BoardRow; onAdd: () => void }) {
  return (
    <button
      type="button"
      onClick={onAdd}
      className="flex min-h-target w-full items-center gap-3 py-1 text-left"
    >
      <PlusIcon className="shrink-0 text-oil" />
      <span className="min-w-0 flex-1 leading-snug wrap-anywhere">
        <strong className="block">{row.name}</strong>
        <span className="text-soft">
          {row.owner.name} · {row.tag}
        </span>
      </span>
      <span className="tabular-nums">{hoursLeftWords(row.dueInHours)}</span>
    </button>
  );
}

function offeredWords(count: number, find: string, all: number): string {
  if (count > MOST_OFFERED) return `${count - MOST_OFFERED} more: type to find them.`;
  if (count > 0 || all === 0) return "";
  return find.trim()
    ? "No other bike of the Line-up has this name, owner or tag."
    : "Every bike of the Line-up is in the queue.";
}
