import { useSyringes, type BikeWithLog } from "../../../offline/index.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { useLiveDraft } from "../draft/use-live-draft.ts";
import { usualSyringe } from "../draft/use-begin-check.ts";
import { beginQuick, QUICK_FORM, quickDraftSchema } from "./quick-draft.ts";
import { QuickForm } from "./quick-form.tsx";

/** A whole check on one page: for those who know it, and for notes on paper. */
export function QuickPage({ bike: { record, log } }: { bike: BikeWithLog }) {
  const live = useLiveDraft(record.bikeId, QUICK_FORM, quickDraftSchema);
  const syringes = useSyringes();
  if (!live.ready || syringes.isPending) return <main className="flex-1" aria-busy />;
  const { now, displayOffset } = record.summary.hours;
  const { meter, meterFormat } = record.details;
  const begin = () =>
    beginQuick({
      at: new Date().toISOString(),
      hoursText: now === null ? "" : formatHours(now - displayOffset, meterFormat),
      estimatedHours: meter === "estimated",
      syringe: usualSyringe(log, syringes.data ?? []),
    });
  return <QuickForm record={record} live={live} begin={begin} syringes={syringes.data ?? []} />;
}
