import { useState } from "react";
import { Link } from "react-router-dom";
import { useBikes, useUnsent, type KeptEntry } from "../../../offline/index.ts";
import type { QueuedBike } from "../../../offline/test-day.ts";
import { Button } from "../../../ui/button.tsx";
import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { testDayBikePath } from "../../../ui/paths.ts";
import { actionInks, actionWords } from "../../../ui/words.ts";

/** The last few, to be looked at once more. */
const LAST = 5;

interface Props {
  clubId: string;
  bikes: QueuedBike[];
}

/** Who is done, the last one first, with what came out and where the entry is. */
export function DoneList({ clubId, bikes }: Props) {
  const unsent = useUnsent().data ?? [];
  const [whole, setWhole] = useState(false);
  const shown = whole ? bikes : bikes.slice(-LAST);
  if (bikes.length === 0) return null;
  return (
    <section aria-labelledby="done" className="flex flex-col gap-3">
      <h2 id="done" className="text-2xl">
        Done: {bikes.length}
      </h2>
      <ol className="divide-y divide-rule border-y border-rule">
        {shown.toReversed().map((bike) => (
          <li key={bike.bikeId}>
            <Link
              to={testDayBikePath(clubId, bike.bikeId)}
              className="flex min-h-target flex-wrap items-center justify-between gap-x-4 py-2 leading-snug"
            >
              <span className="min-w-0 wrap-anywhere">
                <strong className="block text-lg">{bike.name}</strong>
                <span className="text-soft">{bike.owner}</span>
              </span>
              <Outcome bike={bike} unsent={unsent} />
            </Link>
          </li>
        ))}
      </ol>
      {shown.length < bikes.length && (
        <Button onClick={() => setWhole(true)}>Show all {bikes.length}</Button>
      )}
    </section>
  );
}

function Outcome({ bike, unsent }: { bike: QueuedBike; unsent: KeptEntry[] }) {
  const here = useBikes().data?.find(({ bikeId }) => bikeId === bike.bikeId);
  const check = here?.summary.checks.find(({ entryId }) => entryId === bike.entryId);
  const waiting = unsent.find(({ entry }) => entry.id === bike.entryId);
  // Never *ride on* against what somebody wrote.
  const action = here?.lineUp.stopAdvised ? "stop" : check?.action;
  return (
    <span className="flex flex-col items-end">
      {check && action ? (
        <strong className={actionInks[action]}>{actionWords[action]}</strong>
      ) : (
        here && <strong>Not counted</strong>
      )}
      <EntryStateMark state={waiting?.state ?? "sent"} />
    </span>
  );
}
