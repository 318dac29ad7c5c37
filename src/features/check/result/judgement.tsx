import type { CheckBody } from "../../../../shared/schemas/entry.ts";
import type { CheckSummary } from "../../../../shared/schemas/summary.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { ActionLine } from "../../../ui/action-line.tsx";
import { certaintySentence } from "../../../ui/certainty-sentence.ts";
import { Column } from "../../../ui/column.tsx";
import { settlingSentence } from "../../../ui/settling-sentence.ts";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import { CheckFigures } from "./check-figures.tsx";
import { CheckFlags } from "./check-flags.tsx";
import { columnOfCheck } from "./column-of-check.ts";

interface Props {
  details: BikeRecord["details"];
  check: CheckSummary;
  /** All that has to be said beside the numbers. */
  flags: readonly string[];
  body: CheckBody;
  /** Nothing is said of riding while the engine must not be started. */
  hoseMaybeOff: boolean;
  /** Lets the oil rise, once, when a result appears. */
  fills?: boolean;
}

/** What one check says: the action first, then the verdict and how sure it is, then the numbers. */
export function Judgement({ details, check, flags, body, hoseMaybeOff, fills }: Props) {
  const certainty = certaintySentence(check);
  const sayAction = check.action !== "ride" || !hoseMaybeOff;
  return (
    <>
      {sayAction && <ActionLine action={check.action} huge />}
      <p className="text-xl">
        <VerdictMark verdict={check.verdict} />
      </p>
      <p className="text-lg">{certainty ?? settlingSentence(check)}</p>
      <div className="flex flex-wrap gap-x-6 gap-y-4">
        <div className="mx-auto w-60 max-w-full shrink-0">
          <Column
            size="large"
            fills={fills}
            {...columnOfCheck(check, details.actDrop, body.syringe)}
          />
        </div>
        <div className="flex min-w-0 flex-[1_1_14rem] flex-col gap-4">
          <CheckFigures check={check} body={body} sequence={details.sequence} />
          <CheckFlags flags={flags} spoilers={body.spoilers ?? []} />
        </div>
      </div>
    </>
  );
}
