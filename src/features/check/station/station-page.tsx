import { useParams } from "react-router-dom";
import { useBike, useHoldUpdates } from "../../../offline/index.ts";
import { useTestDay } from "../../../offline/test-day.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Page } from "../../../ui/page.tsx";
import { testDayPath } from "../../../ui/paths.ts";
import { StationForm } from "./station-form.tsx";
import { StationResult } from "./station-result.tsx";

/** One bike of a test day: its check on one screen, and then what came out. */
export default function StationPage() {
  const { clubId = "", bikeId = "" } = useParams();
  const { testDay, ready } = useTestDay(clubId);
  const { data: bike, isFetching } = useBike(bikeId);
  useHoldUpdates();
  if (!ready || bike === undefined) return <main className="flex-1" aria-busy />;
  const queued = testDay.bikes.find((one) => one.bikeId === bikeId);
  const { syringe } = testDay;
  if (!queued)
    return (
      <NotYet clubId={clubId} title="This bike is not in the queue">
        Add it on the test day’s page.
      </NotYet>
    );
  if (!bike)
    return (
      <NotYet clubId={clubId} title={queued.name}>
        Its log is not on this phone yet, or it is no longer shared with you. Fetch the logs where
        there is a network.
      </NotYet>
    );
  if (!syringe)
    return (
      <NotYet clubId={clubId} title={queued.name}>
        Choose the station’s syringe first.
      </NotYet>
    );
  const station = { clubId, testDay, queued, bike };
  return (
    <div className="flex flex-1 flex-col [--target:56px]">
      {queued.entryId ? (
        <StationResult
          key={queued.entryId}
          {...station}
          entryId={queued.entryId}
          reading={isFetching}
        />
      ) : (
        <StationForm key={bikeId} {...station} syringe={syringe} />
      )}
    </div>
  );
}

function NotYet(props: { clubId: string; title: string; children: string }) {
  const back = testDayPath(props.clubId);
  return (
    <Page
      title={props.title}
      back={{ to: back, label: "Test day" }}
      action={
        <ButtonLink look="primary" wide to={back}>
          To the test day
        </ButtonLink>
      }
    >
      <p>{props.children}</p>
    </Page>
  );
}
