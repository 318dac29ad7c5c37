import { Link } from "react-router-dom";
import type { LogEntryOf, MeterFormat } from "../../../../shared/schemas/entry.ts";
import type { KeptEntry } from "../../../offline/index.ts";
import { checkResultPath } from "../../../ui/paths.ts";
import { entryFacts } from "./entry-facts.ts";
import type { LogLine } from "./log-lines.ts";

interface Props {
  line: LogLine;
  meterFormat: MeterFormat;
  onStrike: (kept: KeptEntry) => void;
}

const actionClass = "flex min-h-target items-center font-bold text-oil";

/** What can be done with a line: a check opened up, its result seen, an entry struck. */
export function LineActions({ line: { kept, struckBy, canStrike }, meterFormat, onStrike }: Props) {
  const check = kept.understood && kept.entry.kind === "check" ? kept.entry : null;
  return (
    <div className={`flex flex-wrap gap-x-5 ${check ? "flex-auto justify-between" : "ml-auto"}`}>
      {check && <WhatWasWritten check={check} meterFormat={meterFormat} />}
      {check && !struckBy && (
        <Link to={checkResultPath(check.bikeId, check.id)} className={actionClass}>
          Result
        </Link>
      )}
      {canStrike && (
        <button type="button" onClick={() => onStrike(kept)} className={actionClass}>
          Strike
        </button>
      )}
    </div>
  );
}

function WhatWasWritten(props: { check: LogEntryOf<"check">; meterFormat: MeterFormat }) {
  return (
    <details className="mr-auto open:basis-full">
      <summary className={actionClass}>What was written</summary>
      <ul className="pb-1">
        {entryFacts(props.check, props.meterFormat).map((fact) => (
          <li key={fact}>{fact}</li>
        ))}
      </ul>
    </details>
  );
}
