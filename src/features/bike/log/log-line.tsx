import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatWhen } from "../../../ui/format-when.ts";
import { checkResultPath } from "../../../ui/paths.ts";
import { kindWords } from "../../../ui/words.ts";
import type { BikeRecord, KeptEntry } from "../../../offline/index.ts";
import type { HistoryPoint } from "../history/history-point.ts";
import { CheckReading } from "./check-reading.tsx";
import { EntryFacts } from "./entry-facts-list.tsx";
import type { LogLine } from "./log-lines.ts";
import { RefusedEntry } from "./refused-entry.tsx";

interface Props {
  line: LogLine;
  record: BikeRecord;
  /** Where the entry is a check that was measured. */
  point: HistoryPoint | undefined;
  onStrike: (kept: KeptEntry) => void;
}

/** One entry: what it says, when, by whom, where it is, and whether it still counts. */
export function LogEntryLine({ line, record, point, onStrike }: Props) {
  const { kept, struckBy, strikes, canStrike } = line;
  const { entry } = kept;
  const isCheck = kept.understood && kept.entry.kind === "check";
  return (
    <li className="flex flex-col gap-1 border-t border-rule py-3">
      <div className={struckBy ? "text-soft line-through" : ""}>
        <div className="flex flex-wrap items-baseline justify-between gap-x-4">
          <h3 className="text-lg">{kept.understood ? kindWords[kept.entry.kind] : "Entry"}</h3>
          {kept.understood && kept.entry.hours !== null && (
            <span className="font-bold tabular-nums">
              {formatHours(kept.entry.hours, record.details.meterFormat)}&nbsp;h
            </span>
          )}
        </div>
        {isCheck && (
          <CheckReading
            point={point}
            resultPath={struckBy ? null : checkResultPath(record.bikeId, entry.id)}
          />
        )}
        {kept.understood ? (
          <EntryFacts entry={kept.entry} meterFormat={record.details.meterFormat} />
        ) : (
          <p>Written by a newer version of the app, which can show it. It is kept as it is.</p>
        )}
        {strikes && <p>{struckEntryWords(strikes)}</p>}
      </div>
      {struckBy && (
        <p>
          <span className="font-bold">Struck:</span> {struckBy.body.reason}
        </p>
      )}
      {kept.state === "refused" && !struckBy && <RefusedEntry kept={kept} reason={kept.reason} />}
      <div className="flex flex-wrap items-center justify-between gap-x-3">
        <p className="flex flex-wrap items-center gap-x-3 text-sm text-soft">
          {formatWhen(entry.at)}
          <span>{kept.mine ? "you" : entry.author?.name}</span>
          <EntryStateMark state={kept.state} />
        </p>
        {canStrike && (
          <button
            type="button"
            onClick={() => onStrike(kept)}
            className="ml-auto min-h-target font-bold text-oil"
          >
            Strike
          </button>
        )}
      </div>
    </li>
  );
}

function struckEntryWords({ understood, entry }: KeptEntry): string {
  const what = understood ? kindWords[entry.kind].toLowerCase() : "entry";
  return `The ${what} of ${formatWhen(entry.at)}`;
}
