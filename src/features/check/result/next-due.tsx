import type { Summary } from "../../../../shared/schemas/summary.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatDate } from "../../../ui/format-when.ts";

interface Props {
  summary: Summary;
  details: BikeRecord["details"];
}

/** When the next check is due, and why. */
export function NextDue({ summary: { due, hours }, details: { meterFormat } }: Props) {
  const left = formatHours(due.inHours, meterFormat);
  const shown = formatHours(due.atHours - hours.displayOffset, meterFormat);
  return (
    <section aria-labelledby="next-check" className="border-t border-rule pt-4">
      <h2 id="next-check" className="text-xl">
        Next check: {due.inHours > 0.05 ? `in ${left}\u00a0h` : "now"}
      </h2>
      <p>
        {due.inHours > 0.05 && `At ${shown}\u00a0h on the meter. `}
        {due.reason}
        {due.onDate && due.inHours > 0.05 && ` Likely about ${formatDate(due.onDate)}.`}
      </p>
    </section>
  );
}
