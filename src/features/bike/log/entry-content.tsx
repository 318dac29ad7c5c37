import type { LogEntry, MeterFormat } from "../../../../shared/schemas/entry.ts";
import type { KeptEntry } from "../../../offline/index.ts";
import type { HistoryPoint } from "../history/history-point.ts";
import { CheckReading } from "./check-reading.tsx";
import { entryFacts } from "./entry-facts.ts";

interface Props {
  kept: KeptEntry;
  point: HistoryPoint | undefined;
  meterFormat: MeterFormat;
}

/** What an entry says: a check what it came to, every other kind what was written. */
export function EntryContent({ kept, point, meterFormat }: Props) {
  if (!kept.understood)
    return <p>Written by a newer version of the app, which can show it. It is kept as it is.</p>;
  const { entry } = kept;
  const note = noteOf(entry);
  return (
    <>
      {entry.kind === "check" ? (
        <CheckReading point={point} />
      ) : (
        <p>{entryFacts(entry, meterFormat).join(" · ")}</p>
      )}
      {note && <p className="whitespace-pre-line">{note}</p>}
    </>
  );
}

function noteOf(entry: LogEntry): string | undefined {
  if (entry.kind === "note") return entry.body.text;
  if (entry.kind === "strike") return entry.body.reason;
  return "note" in entry.body ? entry.body.note : undefined;
}
