import { useState } from "react";
import { Link } from "react-router-dom";
import { saveEntry, useHoldUpdates, type BikeRecord, type NewEntry } from "../../offline/index.ts";
import { AskAboutGain } from "../../ui/ask-about-gain.tsx";
import { Button } from "../../ui/button.tsx";
import { DateTimeField } from "../../ui/date-time-field.tsx";
import { Fold } from "../../ui/fold.tsx";
import { Form } from "../../ui/form.tsx";
import { formatHours } from "../../ui/format-hours.ts";
import { formatWhen } from "../../ui/format-when.ts";
import { HoursField } from "../../ui/hours-field.tsx";
import { Notice } from "../../ui/notice.tsx";
import { parseHours } from "../../ui/parse-hours.ts";
import { logEntryPath } from "../../ui/paths.ts";
import { Sheet } from "../../ui/sheet.tsx";
import { FieldErrors, useSubmit } from "../../ui/use-submit.ts";
import { doubtWords } from "../../ui/doubt-words.ts";
import { useDoubt } from "./use-doubt.ts";

interface Props {
  bike: BikeRecord;
  onClose: () => void;
}

/** Two taps and a number: the last reading stands ready to be typed over or stepped up. */
export default function LogHoursSheet({ bike, onClose }: Props) {
  useHoldUpdates();
  const { meter, meterFormat } = bike.details;
  const { now, displayOffset, readAt } = bike.summary.hours;
  const last = now === null ? null : formatHours(now - displayOffset, meterFormat);
  const [text, setText] = useState(last ?? "");
  const [opened] = useState(() => new Date().toISOString());
  const [at, setAt] = useState<string | null>(null);
  const hours = parseHours(text);

  const entryAt = (instant: string): NewEntry | null =>
    hours === null
      ? null
      : {
          bikeId: bike.bikeId,
          kind: "hours",
          at: instant,
          hours,
          body: meter === "estimated" ? { estimated: true } : {},
        };
  const doubt = useDoubt(bike, entryAt(at ?? opened));

  const { submit, busy, errors, problem } = useSubmit(async () => {
    const entry = entryAt(at ?? new Date().toISOString());
    if (!entry) throw new FieldErrors({ hours: "Type the hours as the meter shows them." });
    await saveEntry(entry);
    onClose();
  });

  return (
    <Sheet title={`Log hours: ${bike.details.name}`} onClose={onClose}>
      <Form onSubmit={submit} problem={problem}>
        <div>
          <HoursField
            label={meter === "estimated" ? "Engine hours, estimated" : "Engine hours"}
            hint={last && readAt ? `Last: ${last} h on ${formatWhen(readAt)}` : undefined}
            error={errors.hours}
            value={text}
            onChange={setText}
            meterFormat={meterFormat}
            large
          />
          {!doubt && <AskAboutGain hours={bike.summary.hours} text={text} at={at ?? opened} />}
        </div>
        {doubt && (
          <Notice tone="caution" title={doubtWords[doubt]}>
            <p>
              You can save it: it is kept, and counts once you confirm it in the Shed. Was the meter
              changed?{" "}
              <Link
                to={logEntryPath(bike.bikeId, "meter")}
                className="font-bold text-oil underline"
              >
                Log the meter change
              </Link>
            </p>
          </Notice>
        )}
        <Fold title={`When: ${at ? formatWhen(at) : "now"}`}>
          <DateTimeField label="Read at" value={at ?? opened} onChange={setAt} error={errors.at} />
        </Fold>
        <Button type="submit" look="primary" wide disabled={busy}>
          Save hours
        </Button>
      </Form>
    </Sheet>
  );
}
