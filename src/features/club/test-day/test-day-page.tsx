import type { Club } from "../../../../shared/schemas/club.ts";
import type { Syringe } from "../../../offline/index.ts";
import { changeTestDay, useTestDay, type TestDay } from "../../../offline/test-day.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Page } from "../../../ui/page.tsx";
import { clubPath, testDayBikePath } from "../../../ui/paths.ts";
import { HalfDone } from "../half-done.tsx";
import { AddToQueue } from "./add-to-queue.tsx";
import { DoneList } from "./done-list.tsx";
import { EndTestDay } from "./end-test-day.tsx";
import { QueueList } from "./queue-list.tsx";
import { StationSyringe } from "./station-syringe.tsx";

/** Many bikes in a row, with no signal: who waits, what they are measured with, who is done. */
export function TestDayPage({ club }: { club: Club }) {
  const { testDay, ready } = useTestDay(club.id);
  if (!ready) return <main className="flex-1" aria-busy />;
  return <TestDayAsItStands club={club} testDay={testDay} />;
}

function TestDayAsItStands({ club, testDay }: { club: Club; testDay: TestDay }) {
  const waiting = testDay.bikes.filter(({ entryId }) => entryId === null);
  const done = testDay.bikes.filter(({ entryId }) => entryId !== null);
  const [next] = waiting;
  const setSyringe = (syringe: Syringe) =>
    void changeTestDay(club.id, (now) => ({ ...now, syringe }));
  return (
    <Page
      title="Test day"
      back={{ to: clubPath(club.id), label: "Line-up" }}
      wide
      action={
        next && (
          <ButtonLink look="primary" wide to={testDayBikePath(club.id, next.bikeId)}>
            {done.length > 0 ? "Next" : "Start"}: {next.name}
          </ButtonLink>
        )
      }
    >
      <p className="-mt-3 text-lg wrap-anywhere">{club.name}</p>
      <div className="grid items-start gap-8 min-[900px]:grid-cols-2">
        <div className="flex min-w-0 flex-col gap-8">
          <HalfDone />
          <StationSyringe value={testDay.syringe} onChange={setSyringe} />
          <QueueList clubId={club.id} bikes={waiting} />
          <DoneList clubId={club.id} bikes={done} />
        </div>
        <div className="flex min-w-0 flex-col gap-8">
          <AddToQueue club={club} testDay={testDay} />
          {testDay.bikes.length > 0 && <EndTestDay clubId={club.id} waiting={waiting.length} />}
        </div>
      </div>
    </Page>
  );
}
