import { flagSentences } from "../../../../shared/delivery/flags.ts";
import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { ActionLine } from "../../../ui/action-line.tsx";
import { Card } from "../../../ui/card.tsx";
import { certaintySentence } from "../../../ui/certainty-sentence.ts";
import { formatMlGiveOrTake } from "../../../ui/format-quantity.ts";
import { isStop } from "../../../ui/stop-advised.tsx";
import { VerdictMark } from "../../../ui/verdict-mark.tsx";
import { actionInks } from "../../../ui/words.ts";
import type { CheckEntry } from "../draft/check-entry.ts";
import { CheckFlags } from "../result/check-flags.tsx";
import { usePreview } from "../use-preview.ts";

interface Props {
  record: BikeRecord;
  entry: CheckEntry | null;
}

/** A good check lifts no advice. */
const StopStands = () => (
  <p className={`text-2xl leading-tight font-bold ${actionInks.stop}`}>
    The stop that was advised still stands.
  </p>
);

/** What the check would say if it were saved as it stands. */
export function LiveResult({ record, entry }: Props) {
  const preview = usePreview(record, entry).data;
  if (!entry || !preview) return null;
  const { check, summary } = preview;
  const { flags } = measureDelivery(entry.body, record.details.sequence);
  if (!check)
    return (
      <Card aria-label="So far">
        <p className="font-bold">{flagSentences["nothing-to-count"]}</p>
        <CheckFlags flags={flags.filter((flag) => flag !== "nothing-to-count")} spoilers={[]} />
      </Card>
    );
  const sayAction = check.action !== "ride" || !isStop(record.advice);
  const doubted = summary.flags.filter((flag) => flag === "hours-doubtful");
  return (
    <Card aria-label="So far" className="flex flex-col gap-2">
      {isStop(record.advice) && <StopStands />}
      {sayAction && <ActionLine action={check.action} large />}
      <VerdictMark verdict={check.verdict} />
      <p>{certaintySentence(check)}</p>
      <p>
        <strong>{formatMlGiveOrTake(check.perRunMl, check.uMl)}</strong> a run
      </p>
      <CheckFlags flags={[...check.flags, ...doubted]} spoilers={[]} />
    </Card>
  );
}
