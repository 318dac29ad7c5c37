import type { DoubtfulReading } from "../../../../shared/schemas/summary.ts";
import { saveEntry, type BikeRecord, type KeptEntry } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { doubtWords } from "../../../ui/doubt-words.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatWhen } from "../../../ui/format-when.ts";
import { Notice } from "../../../ui/notice.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";

interface Props {
  record: BikeRecord;
  reading: DoubtfulReading;
  /** The entry that holds the reading. */
  kept: KeptEntry | undefined;
  /** Left out where this account may not strike it. */
  onStrike?: () => void;
}

/** A reading that does not fit the others: kept, and not counted until the rider says so. */
export function DoubtfulReadingNotice({ record, reading, kept, onStrike }: Props) {
  const hours = reading.atHours - record.summary.hours.displayOffset;
  const shown = `${formatHours(hours, record.details.meterFormat)}\u00a0h`;
  const { submit, busy, problem } = useSubmit(async () => {
    await saveEntry({
      bikeId: record.bikeId,
      kind: "hours",
      at: new Date().toISOString(),
      hours,
      body: { confirms: reading.entryId },
    });
  });
  return (
    <Notice tone="caution" title={`Does the meter show ${shown}?`}>
      <p>
        {kept && `Written ${formatWhen(kept.entry.at)}. `}
        {doubtWords[reading.why]} It is kept, and does not count until you confirm it.
      </p>
      {problem && <p className="font-bold text-low">{problem}</p>}
      <div className="flex flex-wrap gap-2">
        <Button disabled={busy} onClick={() => void submit()}>
          Yes, the meter shows this
        </Button>
        {onStrike && <Button onClick={onStrike}>No, strike it</Button>}
      </div>
    </Notice>
  );
}
