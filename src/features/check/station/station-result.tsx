import { useNavigate } from "react-router-dom";
import { noteCheck } from "../../../offline/test-day.ts";
import { Button } from "../../../ui/button.tsx";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { formatWhen } from "../../../ui/format-when.ts";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { closeOutPath, logEntryPath, testDayBikePath, testDayPath } from "../../../ui/paths.ts";
import { isStop, StopAdvised } from "../../../ui/stop-advised.tsx";
import { Judgement } from "../result/judgement.tsx";
import { NextDue } from "../result/next-due.tsx";
import { useArmed } from "../steps/use-armed.ts";
import { nextInQueue, placeInQueue, type StationProps } from "./station-props.ts";

interface Props extends StationProps {
  entryId: string;
  /** True while the log is being read again: a check just saved may not be in it yet. */
  reading: boolean;
}

/** What came out, at once and large; then who is next. */
export function StationResult({ entryId, reading, ...station }: Props) {
  const { clubId, queued, bike } = station;
  const { bikeId, details, summary, advice } = bike.record;
  const line = bike.log.find(({ entry }) => entry.id === entryId);
  const check = summary.checks.find((one) => one.entryId === entryId);
  const here = testDayBikePath(clubId, bikeId);
  if (!line && reading) return <main className="flex-1" aria-busy />;
  const hoseMaybeOff = summary.flags.includes("not-closed-out");
  const entry = line?.understood && line.entry.kind === "check" ? line.entry : null;
  return (
    <Page
      title={queued.name}
      back={{ to: testDayPath(clubId), label: "Test day" }}
      action={<WayOn {...station} />}
    >
      <p className="-mt-3 text-soft">{placeInQueue(station)}</p>
      {isStop(advice) && <StopAdvised advice={advice} />}
      {hoseMaybeOff && (
        <Notice tone="error" title="Hose may be off: do not start">
          <ButtonLink look="danger" to={closeOutPath(bikeId)}>
            Close it out
          </ButtonLink>
        </Notice>
      )}
      {check && entry ? (
        <Judgement
          fills
          details={details}
          check={check}
          flags={[...check.flags, ...summary.flags]}
          body={entry.body}
          hoseMaybeOff={hoseMaybeOff || isStop(advice)}
        />
      ) : (
        <Notice tone="caution" title="This check does not count">
          <p>It stays in the log.</p>
        </Notice>
      )}
      {line && (
        <p className="flex flex-wrap justify-between gap-x-4">
          <span>{formatWhen(line.entry.at)}</span>
          <EntryStateMark state={line.state} />
        </p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button className="flex-auto" onClick={() => void noteCheck(clubId, bikeId, null)}>
          Check it again
        </Button>
        <ButtonLink
          className="flex-auto"
          to={logEntryPath(bikeId, "note")}
          state={{ back: { to: here, label: queued.name } }}
        >
          Advise the owner
        </ButtonLink>
      </div>
      <NextDue summary={summary} details={details} />
    </Page>
  );
}

/** It appears where *Save* was just pressed, so it waits a moment before it can be. */
function WayOn(station: StationProps) {
  const armed = useArmed();
  const navigate = useNavigate();
  const next = nextInQueue(station);
  const { clubId } = station;
  return (
    <Button
      look="primary"
      wide
      disabled={!armed}
      onClick={() =>
        void navigate(next ? testDayBikePath(clubId, next.bikeId) : testDayPath(clubId))
      }
    >
      {next ? `Next: ${next.name}` : "All done: to the test day"}
    </Button>
  );
}
