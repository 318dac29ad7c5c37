import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import {
  formatMl,
  formatMlGiveOrTake,
  GIVE_OR_TAKE,
  formatPercent,
} from "../../../ui/format-quantity.ts";
import { checkBody, checkEntry, type CheckEntry } from "../draft/check-entry.ts";
import { runStatistics, uncertaintyMl, withOneMoreRun } from "../draft/one-more-run.ts";
import { CheckFlags } from "../result/check-flags.tsx";
import { useOpenCheck } from "../open-check.ts";
import { usePreview } from "../use-preview.ts";

/** Mean and spread so far, and what one more run like these would add. */
export function OneMoreRun() {
  const { draft, record, sequence } = useOpenCheck();
  const body = checkBody(draft, sequence);
  const { delivery, flags } = measureDelivery(body, sequence);
  const statistics = runStatistics(body);
  const thenMl = uncertaintyMl(withOneMoreRun(body), sequence);
  return (
    <div className="flex flex-col gap-2">
      {statistics && delivery && thenMl !== null && (
        <p className="text-lg">
          Mean{" "}
          <strong className="block text-[min(2.25rem,9vw)] tabular-nums">
            {formatMlGiveOrTake(statistics.meanMl, delivery.uMl)}
          </strong>
          {statistics.count > 1 && `The runs lie ${formatMl(statistics.spreadMl)} apart. `}
          One more run like {statistics.count > 1 ? "these" : "this"} would make it{" "}
          {`±\u00a0${formatMl(GIVE_OR_TAKE * thenMl)}`}.
        </p>
      )}
      <CheckFlags flags={flags} spoilers={[]} />
      <Certainty entry={checkEntry(draft, { bikeId: record.bikeId, sequence })} />
    </div>
  );
}

/** How sure it is not low, or low: now, and with one more run. */
function Certainty({ entry }: { entry: CheckEntry | null }) {
  const { record } = useOpenCheck();
  const then = entry && { ...entry, body: withOneMoreRun(entry.body) };
  const now = usePreview(record, entry).data?.check?.pLow ?? null;
  const withOne = usePreview(record, then).data?.check?.pLow ?? null;
  if (now === null || withOne === null) return null;
  const below = now >= 0.5;
  const sure = (pLow: number) => formatPercent(below ? pLow : 1 - pLow);
  return (
    <p className="text-lg">
      <strong>{sure(now)} sure</strong> the delivery is {below ? "below" : "above"} the limit; with
      one more run like these, {sure(withOne)}.
    </p>
  );
}
