import { useState } from "react";
import type { BikeWithLog } from "../../offline/index.ts";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Button } from "../../ui/button.tsx";
import { formatWhen } from "../../ui/format-when.ts";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { bikePath } from "../../ui/paths.ts";
import { furthestStep, stepPaths } from "./check-paths.ts";
import { abandoned, readRuns } from "./draft/check-draft.ts";
import type { CheckDraft } from "./draft/check-draft-schema.ts";
import { useBeginCheck } from "./draft/use-begin-check.ts";
import { useOpenDraft } from "./draft/use-open-draft.ts";
import { GiveUpSheet } from "./give-up-sheet.tsx";

/** Where the Shed's button leads: the guided check, or the quick form for those who know it. */
export function StartPage({ bike: { record, log } }: { bike: BikeWithLog }) {
  const { bikeId, details, summary } = record;
  const paths = stepPaths(bikeId);
  const { ready, open, set, hoseMaybeOff } = useOpenDraft(record);
  const begin = useBeginCheck({ record, log }, { set, hoseMaybeOff });
  const [givingUp, setGivingUp] = useState(false);
  if (!ready) return <main className="flex-1" aria-busy />;
  return (
    <Page
      title="Delivery check"
      back={{ to: bikePath(bikeId), label: details.name }}
      action={
        <>
          {open ? (
            <ButtonLink look="primary" wide to={furthestStep(paths, open.draft)}>
              Go on with it
            </ButtonLink>
          ) : (
            <Button look="primary" wide onClick={begin}>
              Start the guided check
            </Button>
          )}
          <ButtonLink wide to={paths.quick}>
            Quick form
          </ButtonLink>
        </>
      }
    >
      {hoseMaybeOff && !open && (
        <Notice tone="error" title="Hose may be off: do not start">
          <p>
            {summary.flags.includes("not-closed-out")
              ? "The last check was not closed out."
              : "A check was given up with the hose off."}
          </p>
          <ButtonLink look="danger" to={paths.closeOut}>
            Close it out
          </ButtonLink>
        </Notice>
      )}
      {open ? (
        <OpenCheckCard draft={open.draft} onGiveUp={() => setGivingUp(true)} />
      ) : (
        <WhatItTakes />
      )}
      <p className="text-soft">
        The quick form takes the same check on one page: for those who know it, and for notes on
        paper.
      </p>
      {givingUp && open && (
        <GiveUpSheet
          hoseMaybeOff={open.draft.hoseMaybeOff}
          onClose={() => setGivingUp(false)}
          onGiveUp={() => {
            set(abandoned(open.draft));
            setGivingUp(false);
          }}
        />
      )}
    </Page>
  );
}

function OpenCheckCard({ draft, onGiveUp }: { draft: CheckDraft; onGiveUp: () => void }) {
  const read = readRuns(draft).length;
  return (
    <Notice tone="caution" title="A check is half done">
      <p>
        Begun {formatWhen(draft.at)}; {read === 1 ? "1 run" : `${read} runs`} read. Everything is as
        you left it.{draft.hoseMaybeOff && " The hose may be off: do not start the engine."}
      </p>
      <Button onClick={onGiveUp}>Give it up</Button>
    </Notice>
  );
}

/** For someone who has never done one. */
function WhatItTakes() {
  return (
    <>
      <p className="text-lg">
        You catch what the oil pump gives in one priming sequence in a syringe, read it, and the app
        says whether the pump still keeps up, and how sure that is.
      </p>
      <ul className="list-disc pl-6">
        <li>a syringe, its plunger out and its tip plugged</li>
        <li>the oil hose within reach of it, a clean rag, gloves</li>
        <li>what the bike’s workshop manual says on starting the priming sequence</li>
        <li>ten minutes</li>
      </ul>
    </>
  );
}
