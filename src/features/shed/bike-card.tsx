import { lazy, Suspense, useState } from "react";
import { Link } from "react-router-dom";
import { OnwardIcon } from "../../ui/icons.tsx";
import { ActionLine } from "../../ui/action-line.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Button } from "../../ui/button.tsx";
import { Card } from "../../ui/card.tsx";
import { columnOfSummary } from "../../ui/column-of-summary.ts";
import { Column } from "../../ui/column.tsx";
import { EntryStateMark } from "../../ui/entry-state-mark.tsx";
import { Notice } from "../../ui/notice.tsx";
import { bikePath, checkPath, closeOutPath } from "../../ui/paths.ts";
import { VerdictMark } from "../../ui/verdict-mark.tsx";
import { HoursLeft } from "./hours-left.tsx";
import type { ShedBike } from "./shed-bikes.ts";

const StopAdvised = lazy(() => import("./stop-advised.tsx"));
const DoubtfulReadings = lazy(() => import("./doubtful-readings.tsx"));
const LogHoursSheet = lazy(() => import("./log-hours-sheet.tsx"));

/** One bike at arm's length: hours to its next check, what to do, how its delivery stands. */
export function BikeCard({ bike }: { bike: ShedBike }) {
  const [logging, setLogging] = useState(false);
  const { bikeId, details, summary, lineUp, unsent, hoseMaybeOff, checkOpen } = bike;
  const checkFirst = summary.due.inHours <= 0;
  return (
    <Card aria-labelledby={`bike-${bikeId}`} className="flex flex-col gap-3">
      <h2 id={`bike-${bikeId}`} className="border-b border-rule pb-2 text-xl">
        <Link
          to={bikePath(bikeId)}
          className="-my-2 flex min-h-target items-center justify-between gap-1 wrap-anywhere"
        >
          {details.name}
          <OnwardIcon className="shrink-0 text-oil" />
        </Link>
      </h2>
      {hoseMaybeOff && (
        <Notice tone="error" title="Hose may be off: do not start">
          <ButtonLink look="danger" to={closeOutPath(bikeId)}>
            Close out the check
          </ButtonLink>
        </Notice>
      )}
      {lineUp.stopAdvised && (
        <Suspense>
          <StopAdvised bike={bike} />
        </Suspense>
      )}
      <div className="flex flex-wrap justify-between gap-3">
        <div className="flex min-w-0 flex-[1_1_10rem] flex-col gap-3">
          <HoursLeft bike={bike} />
          <div className="flex flex-col gap-1">
            {summary.action && !hoseMaybeOff && !lineUp.stopAdvised && (
              <ActionLine action={summary.action} />
            )}
            <VerdictMark verdict={summary.verdict} />
          </div>
        </div>
        <Column size="small" {...columnOfSummary(summary, details.actDrop)} />
      </div>
      {summary.hours.doubtful.length > 0 && (
        <Suspense>
          <DoubtfulReadings bike={bike} />
        </Suspense>
      )}
      <div role="status">{unsent > 0 && <EntryStateMark state="saved" />}</div>
      <div className="flex flex-wrap gap-2">
        <Button
          look={checkFirst ? "quiet" : "primary"}
          className="flex-auto"
          onClick={() => setLogging(true)}
        >
          Log hours
        </Button>
        <ButtonLink
          look={checkFirst ? "primary" : "quiet"}
          className="flex-auto"
          to={checkPath(bikeId)}
        >
          {checkOpen ? "Go on with the check" : "Delivery check"}
        </ButtonLink>
      </div>
      {logging && (
        <Suspense>
          <LogHoursSheet bike={bike} onClose={() => setLogging(false)} />
        </Suspense>
      )}
    </Card>
  );
}
