import type { LogEntry, MeterFormat } from "../../../../shared/schemas/entry.ts";
import { entryFacts } from "./entry-facts.ts";

interface Props {
  entry: LogEntry;
  meterFormat: MeterFormat;
}

/** What was written: at once where it is short, one tap away where it is a check's runs. */
export function EntryFacts({ entry, meterFormat }: Props) {
  const facts = entryFacts(entry, meterFormat);
  const note = noteOf(entry);
  return (
    <>
      {entry.kind === "check" ? (
        <details>
          <summary className="flex min-h-target items-center font-bold text-oil">
            What was written
          </summary>
          <ul className="pb-1">
            {facts.map((fact) => (
              <li key={fact}>{fact}</li>
            ))}
          </ul>
        </details>
      ) : (
        facts.length > 0 && <p>{facts.join(" · ")}</p>
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
