import { useEffect, useState } from "react";
import { fetchBikes, useBikes } from "../../../offline/index.ts";
import type { QueuedBike } from "../../../offline/test-day.ts";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { QueueLine } from "./queue-line.tsx";
import { readinessOf } from "./queue.ts";

/** The next few are what matters at the station. */
const FIRST = 5;

interface Props {
  clubId: string;
  /** Those that wait, the next one first. */
  bikes: QueuedBike[];
}

/** Who waits, and whether their logs are on this phone. */
export function QueueList({ clubId, bikes }: Props) {
  const here = useBikes().data ?? [];
  const [whole, setWhole] = useState(false);
  const shown = whole ? bikes : bikes.slice(0, FIRST);
  const missing = bikes.filter((bike) => readinessOf(bike, here) !== "ready").length;
  return (
    <section aria-labelledby="queue" className="flex flex-col gap-3">
      <h2 id="queue" className="text-2xl">
        Queue: {bikes.length}
      </h2>
      {bikes.length === 0 ? (
        <p>Nobody waits. Add the bikes while there is a network: their logs are fetched then.</p>
      ) : (
        <Logs bikeIds={bikes.map(({ bikeId }) => bikeId)} missing={missing} />
      )}
      <ol className="divide-y divide-rule border-y border-rule empty:hidden">
        {shown.map((bike) => (
          <QueueLine
            key={bike.bikeId}
            clubId={clubId}
            bike={bike}
            readiness={readinessOf(bike, here)}
          />
        ))}
      </ol>
      {shown.length < bikes.length && (
        <Button onClick={() => setWhole(true)}>Show all {bikes.length}</Button>
      )}
    </section>
  );
}

/** Asked for once on coming here, for bikes that were added with no network. */
function Logs({ bikeIds, missing }: { bikeIds: string[]; missing: number }) {
  const [busy, setBusy] = useState(false);
  const [first] = useState(bikeIds);
  useEffect(() => void fetchBikes(first).catch(() => undefined), [first]);
  const fetchNow = async () => {
    setBusy(true);
    await fetchBikes(bikeIds).catch(() => undefined);
    setBusy(false);
  };
  if (missing === 0)
    return <p role="status">All their logs are on this phone: no network is needed.</p>;
  return (
    <Notice
      tone="caution"
      title={`${missing} of ${bikeIds.length} ${missing === 1 ? "log is" : "logs are"} not on this phone`}
    >
      <p>A bike can be checked here once its log is. That needs the network.</p>
      <Button disabled={busy} onClick={() => void fetchNow()}>
        Fetch them now
      </Button>
    </Notice>
  );
}
