import type { BikeWithLog, KeptEntry } from "../../../offline/index.ts";
import { DoubtfulReadingNotice } from "./doubtful-reading-notice.tsx";

interface Props {
  bike: BikeWithLog;
  onStrike: (kept: KeptEntry) => void;
}

export function DoubtfulReadings({ bike: { record, log }, onStrike }: Props) {
  return record.summary.hours.doubtful.map((reading) => {
    const kept = log.find(({ entry }) => entry.id === reading.entryId);
    const canStrike = kept && (record.access === "owner" || kept.mine);
    return (
      <DoubtfulReadingNotice
        key={reading.entryId}
        record={record}
        reading={reading}
        kept={kept}
        onStrike={canStrike ? () => onStrike(kept) : undefined}
      />
    );
  });
}
