import { useParams } from "react-router-dom";
import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import type { CheckBody, LogEntryOf, Sequence } from "../../../../shared/schemas/entry.ts";
import type { BikeWithLog, KeptEntry } from "../../../offline/index.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { formatWhen } from "../../../ui/format-when.ts";
import { Notice } from "../../../ui/notice.tsx";
import { Page } from "../../../ui/page.tsx";
import { backToLineUp } from "../../../ui/last-line-up.ts";
import { bikePath, patterns } from "../../../ui/paths.ts";
import { isStop, StopAdvised } from "../../../ui/stop-advised.tsx";
import { stepPaths } from "../check-paths.ts";
import { useOpenDraft } from "../draft/use-open-draft.ts";
import { CheckFlags } from "./check-flags.tsx";
import { Judgement } from "./judgement.tsx";
import { NextDue } from "./next-due.tsx";
import { WhatNext } from "./what-next.tsx";

type SavedCheck = KeptEntry & { entry: LogEntryOf<"check"> };

const isCheck = (line: KeptEntry): line is SavedCheck =>
  line.understood && line.entry.kind === "check";

interface Props {
  bike: BikeWithLog;
  /** True while the log is being read again: a check just saved may not be in it yet. */
  reading: boolean;
}

/** What a saved check says, and what to do now. */
export function ResultPage({ bike: { record, log }, reading }: Props) {
  const { entryId } = useParams();
  const { bikeId, access, details, summary, advice } = record;
  const paths = stepPaths(bikeId);
  const { hoseMaybeOff } = useOpenDraft(record);
  const line = log.filter(isCheck).find(({ entry }) => entry.id === entryId);
  const check = summary.checks.find((one) => one.entryId === entryId);
  const back = { to: bikePath(bikeId), label: details.name };
  const home = access === "owner" ? { to: patterns.shed, label: "Shed" } : backToLineUp();
  if (!line && reading) return <main className="flex-1" aria-busy />;
  if (!line)
    return (
      <Page title="This check is not here" back={back}>
        <p>The log of this bike on this phone has no such check.</p>
      </Page>
    );
  const { entry } = line;
  const repeats = check?.action === "repeat";
  const isLast = summary.checks.at(-1)?.entryId === entryId;
  return (
    <Page
      title="Result"
      back={back}
      action={
        <>
          {hoseMaybeOff && (
            <ButtonLink look="primary" wide to={paths.closeOut}>
              Close it out
            </ButtonLink>
          )}
          {repeats && (
            <ButtonLink look={hoseMaybeOff ? "quiet" : "primary"} wide to={paths.start}>
              Repeat the check
            </ButtonLink>
          )}
          <ButtonLink look={hoseMaybeOff || repeats ? "quiet" : "primary"} wide to={home.to}>
            To the {home.label}
          </ButtonLink>
        </>
      }
    >
      <p className="flex flex-wrap justify-between gap-x-4">
        <span>{formatWhen(entry.at)}</span>
        <EntryStateMark state={line.state} />
      </p>
      {isStop(advice) && <StopAdvised advice={advice} />}
      {hoseMaybeOff && (
        <Notice tone="error" title="Hose may be off: do not start">
          <p>Close the check out before anything else.</p>
        </Notice>
      )}
      {check ? (
        <Judgement
          fills
          details={details}
          check={check}
          flags={isLast ? [...check.flags, ...summary.flags] : check.flags}
          body={entry.body}
          hoseMaybeOff={hoseMaybeOff || isStop(advice)}
        />
      ) : (
        <NotCounted body={entry.body} sequence={details.sequence} />
      )}
      {check && isLast && (check.action !== "ride" || check.verdict === "dropping") && (
        <WhatNext record={record} check={entry} hoseMaybeOff={hoseMaybeOff} />
      )}
      <NextDue summary={summary} details={details} />
    </Page>
  );
}

interface NotCountedProps {
  body: CheckBody;
  sequence: Sequence | null;
}

/** A check of which no run counts, or one that was struck or refused since. */
function NotCounted({ body, sequence }: NotCountedProps) {
  const { delivery, flags } = measureDelivery(body, sequence);
  return (
    <>
      <Notice tone="caution" title="This check does not count">
        <p>{delivery && "It was struck, or not accepted. "}It stays in the log.</p>
      </Notice>
      <CheckFlags flags={flags} spoilers={body.spoilers ?? []} />
    </>
  );
}
