import type { DoubtfulReading } from "../../../shared/schemas/summary.ts";
import { saveEntry, type BikeRecord } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { formatHours } from "../../ui/format-hours.ts";
import { Notice } from "../../ui/notice.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { doubtWords } from "../../ui/doubt-words.ts";

/** Readings that do not fit the others: kept, and not counted until the rider says so. */
export default function DoubtfulReadings({ bike }: { bike: BikeRecord }) {
  return bike.summary.hours.doubtful.map((reading) => (
    <DoubtfulReadingNotice key={reading.entryId} bike={bike} reading={reading} />
  ));
}

function DoubtfulReadingNotice({ bike, reading }: { bike: BikeRecord; reading: DoubtfulReading }) {
  const hours = reading.atHours - bike.summary.hours.displayOffset;
  const { submit, busy, problem } = useSubmit(async () => {
    await saveEntry({
      bikeId: bike.bikeId,
      kind: "hours",
      at: new Date().toISOString(),
      hours,
      body: { confirms: reading.entryId },
    });
  });
  const shown = `${formatHours(hours, bike.details.meterFormat)}\u00a0h`;
  return (
    <Notice tone="caution" title={`Does the meter show ${shown}?`}>
      <p>{doubtWords[reading.why]} It is kept, and does not count until you confirm it.</p>
      {problem && <p className="font-bold text-low">{problem}</p>}
      <Button disabled={busy} onClick={() => void submit()}>
        Yes, the meter shows this
      </Button>
    </Notice>
  );
}
