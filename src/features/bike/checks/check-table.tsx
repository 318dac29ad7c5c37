import type { MeterFormat } from "../../../../shared/schemas/entry.ts";
import type { DeliveryHistory } from "../history/delivery-history.ts";
import { CheckRows } from "./check-rows.tsx";
import { seriesHeading } from "./series-heading.ts";

interface Props {
  history: DeliveryHistory;
  meterFormat: MeterFormat;
}

/** Every check, newest first, under what began its baseline series: the chart in words. */
export function CheckTable({ history, meterFormat }: Props) {
  const { series, points } = history;
  const blocks = series.map((one, index) => ({
    one,
    points: points.filter((point) => point.series === index).toReversed(),
  }));
  return (
    <div
      role="region"
      aria-label="All delivery checks as a table"
      tabIndex={0}
      className="overflow-x-auto rounded-card"
    >
      <table className="w-full border-collapse text-left [overflow-wrap:normal]">
        <thead className="text-soft">
          <tr>
            <th scope="col" className="py-1 pr-2 font-normal">
              Hours
            </th>
            <th scope="col" className="py-1 pr-2 font-normal">
              Delivery a run
            </th>
            <th scope="col" className="py-1 pr-2 font-normal">
              Of baseline
            </th>
            <th scope="col" className="py-1 font-normal">
              Verdict
            </th>
          </tr>
        </thead>
        {blocks.toReversed().map(({ one, points }) => (
          <tbody key={one.at}>
            <tr>
              <th
                scope="rowgroup"
                colSpan={4}
                className="border-t-2 border-ink pt-2 pb-1 leading-snug"
              >
                {seriesHeading(one, meterFormat)}
              </th>
            </tr>
            {points.map((point) => (
              <CheckRows key={point.entryId} point={point} meterFormat={meterFormat} />
            ))}
          </tbody>
        ))}
      </table>
    </div>
  );
}
