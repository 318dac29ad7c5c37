import { certaintySentence } from "../../../ui/certainty-sentence.ts";
import { ActionLine } from "../../../ui/action-line.tsx";
import { Column } from "../../../ui/column.tsx";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import type { BikeRecord } from "../../../offline/index.ts";
import type { DeliveryHistory } from "../history/delivery-history.ts";
import { columnOfSession } from "./column-of-session.ts";
import { BikeFlags } from "./bike-flags.tsx";
import { HoursLeft } from "./hours-left.tsx";
import { HoursNow } from "./hours-now.tsx";
import { judgedSession } from "./judged-session.ts";
import { whySentence } from "./why-sentence.ts";

interface Props {
  record: BikeRecord;
  history: DeliveryHistory;
  /** *Ride on* is not said while the engine must not be started, or a *stop* was advised. */
  mayRide: boolean;
}

/** What to do now, why, how sure that is, and when to look again. */
export function WhatToDo({ record, history, mayRide }: Props) {
  const { summary } = record;
  const judged = judgedSession(summary, history.lastSession);
  const certainty = judged && certaintySentence(judged);
  const saysAction = mayRide || judged?.action !== "ride";
  return (
    <section aria-labelledby="now" className="flex flex-wrap gap-x-8 gap-y-6">
      <h2 id="now" className="sr-only">
        What to do now
      </h2>
      <div className="flex min-w-0 flex-[1_1_20rem] flex-col gap-5">
        {judged && saysAction && <ActionLine action={judged.action} large />}
        <HoursLeft record={record} />
        <div className="flex flex-col items-start gap-2">
          <VerdictMark verdict={summary.verdict} />
          <p className="text-lg">{whySentence(judged, history.actLimit)}</p>
          {certainty && <p className="text-lg">{certainty}</p>}
          <BikeFlags flags={summary.flags} />
        </div>
        <HoursNow record={record} />
      </div>
      <div className="w-64 max-w-full">
        <Column size="large" {...columnOfSession(history)} />
      </div>
    </section>
  );
}
