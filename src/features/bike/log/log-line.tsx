import type { BikeRecord, KeptEntry } from "../../../offline/index.ts";
import { EntryStateMark } from "../../../ui/entry-state-mark.tsx";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatWhen } from "../../../ui/format-when.ts";
import { kindWords } from "../../../ui/words.ts";
import type { HistoryPoint } from "../history/history-point.ts";
import { EntryContent } from "./entry-content.tsx";
import { LineActions } from "./line-actions.tsx";
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
  const { kept, struckBy, strikes } = line;
  const { meterFormat } = record.details;
  return (
    <li className="flex flex-col gap-1 border-t border-rule pt-3 pb-2">
      <div className={struckBy ? "text-soft line-through" : ""}>
        <div className="flex flex-wrap items-baseline justify-between gap-x-4">
          <h3 className="text-lg">{kept.understood ? kindWords[kept.entry.kind] : "Entry"}</h3>
          {kept.understood && kept.entry.hours !== null && (
            <span className="font-bold tabular-nums">
              {formatHours(kept.entry.hours, meterFormat)}&nbsp;h
            </span>
          )}
        </div>
        <EntryContent kept={kept} point={point} meterFormat={meterFormat} />
        {strikes && <p>{struckEntryWords(strikes)}</p>}
      </div>
      {struckBy && (
        <p>
          <strong>Struck:</strong> {struckBy.body.reason}
        </p>
      )}
      {kept.state === "refused" && !struckBy && <RefusedEntry kept={kept} reason={kept.reason} />}
      <div className="flex flex-wrap items-center justify-between gap-x-3">
        <p className="flex flex-wrap items-center gap-x-3 text-sm text-soft">
          {formatWhen(kept.entry.at)}
          <span>{kept.mine ? "you" : kept.entry.author?.name}</span>
          <EntryStateMark state={kept.state} />
        </p>
        <LineActions line={line} meterFormat={meterFormat} onStrike={onStrike} />
      </div>
    </li>
  );
}

function struckEntryWords({ understood, entry }: KeptEntry): string {
  const what = understood ? kindWords[entry.kind].toLowerCase() : "entry";
  return `The ${what} of ${formatWhen(entry.at)}`;
}
