import { useState } from "react";
import type { EntryKind } from "../../../../shared/schemas/entry.ts";
import type { BikeWithLog, KeptEntry } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { SelectField } from "../../../ui/select-field.tsx";
import { kindWords } from "../../../ui/words.ts";
import type { DeliveryHistory } from "../history/delivery-history.ts";
import { LogEntryLine } from "./log-line.tsx";
import { kindsIn, logLines } from "./log-lines.ts";
import { WriteInLog } from "./write-in-log.tsx";

interface Props {
  bike: BikeWithLog;
  history: DeliveryHistory;
  onStrike: (kept: KeptEntry) => void;
}

/** A long log is drawn a page at a time: a phone has better things to do. */
const PAGE_LINES = 30;

/** Everything ever written about the bike, newest first. */
export function LogSection({ bike, history, onStrike }: Props) {
  const [kind, setKind] = useState<EntryKind | "all">("all");
  const [shown, setShown] = useState(PAGE_LINES);
  const lines = logLines(bike.record, bike.log);
  const wanted = lines.filter(({ kept }) => kind === "all" || kept.entry.kind === kind);
  return (
    <section aria-labelledby="log" className="flex flex-col gap-3">
      <h2 id="log" className="text-2xl">
        Log
      </h2>
      <WriteInLog bikeId={bike.record.bikeId} />
      <SelectField
        label="Show"
        value={kind}
        onChange={setKind}
        options={[
          { value: "all", label: "Everything" },
          ...kindsIn(lines).map((value) => ({ value, label: kindWords[value] })),
        ]}
      />
      <ol aria-label="Entries, newest first" className="flex flex-col">
        {wanted.slice(0, shown).map((line) => (
          <LogEntryLine
            key={line.kept.entry.id}
            line={line}
            record={bike.record}
            point={history.points.find(({ entryId }) => entryId === line.kept.entry.id)}
            onStrike={onStrike}
          />
        ))}
      </ol>
      {wanted.length > shown && (
        <Button wide onClick={() => setShown(shown + PAGE_LINES)}>
          Show earlier entries ({wanted.length - shown})
        </Button>
      )}
    </section>
  );
}
