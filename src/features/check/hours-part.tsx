import type { BikeRecord } from "../../offline/index.ts";
import { AskAboutGain } from "../../ui/ask-about-gain.tsx";
import { DateTimeField } from "../../ui/date-time-field.tsx";
import { Fold } from "../../ui/fold.tsx";
import { formatHours } from "../../ui/format-hours.ts";
import { formatWhen } from "../../ui/format-when.ts";
import { HoursField } from "../../ui/hours-field.tsx";
import { Tick } from "../../ui/tick.tsx";
import type { CheckDraft } from "./draft/check-draft-schema.ts";

type Hours = Pick<CheckDraft, "at" | "hoursText" | "estimatedHours">;

interface Props {
  record: BikeRecord;
  value: Hours;
  onChange: (change: Partial<Hours>) => void;
  errors: Record<string, string>;
}

/** What the hour meter showed, and when: the last reading stands ready. */
export function HoursPart({ record, value, onChange, errors }: Props) {
  const { meterFormat } = record.details;
  const { now, displayOffset, readAt } = record.summary.hours;
  const last = now === null ? null : formatHours(now - displayOffset, meterFormat);
  return (
    <div>
      <HoursField
        label={value.estimatedHours ? "Engine hours, estimated" : "Engine hours"}
        hint={last && readAt ? `Last: ${last} h on ${formatWhen(readAt)}` : undefined}
        error={errors.hours}
        meterFormat={meterFormat}
        value={value.hoursText}
        onChange={(hoursText) => onChange({ hoursText })}
      />
      <AskAboutGain hours={record.summary.hours} text={value.hoursText} at={value.at} />
      <Fold title={`When: ${formatWhen(value.at)}`}>
        <DateTimeField
          label="Checked at"
          error={errors.at}
          value={value.at}
          onChange={(at) => onChange({ at })}
        />
        <Tick
          checked={value.estimatedHours}
          onChange={(estimatedHours) => onChange({ estimatedHours })}
        >
          The hours are an estimate
        </Tick>
      </Fold>
    </div>
  );
}
