import { useState } from "react";
import type { MeterFormat } from "../../../../shared/schemas/entry.ts";
import type { DeliveryHistory } from "../history/delivery-history.ts";
import { Button } from "../../../ui/button.tsx";
import { CheckRows } from "./check-rows.tsx";
import { seriesHeading } from "./series-heading.ts";
import { tableBlocks } from "./table-blocks.ts";

interface Props {
  history: DeliveryHistory;
  meterFormat: MeterFormat;
}

/** As many checks as fit a glance; the rest is one tap away. */
const GLANCE = 8;

/** The checks, newest first, under what began their baseline series: the chart in words. */
export function CheckTable({ history, meterFormat }: Props) {
  const [all, setAll] = useState(false);
  const count = history.points.length;
  const blocks = tableBlocks(history, all ? count : GLANCE);
  return (
    <div className="flex flex-col gap-3">
      <div
        role="region"
        aria-label="Delivery checks as a table"
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
          {blocks.map(({ series, points }) => (
            <tbody key={series.entryId}>
              <tr>
                <th
                  scope="rowgroup"
                  colSpan={4}
                  className="border-t-2 border-ink pt-2 pb-1 leading-snug"
                >
                  {seriesHeading(series, meterFormat)}
                </th>
              </tr>
              {points.map((point) => (
                <CheckRows key={point.entryId} point={point} meterFormat={meterFormat} />
              ))}
            </tbody>
          ))}
        </table>
      </div>
      {count > GLANCE && !all && (
        <Button wide onClick={() => setAll(true)}>
          Show all {count} checks
        </Button>
      )}
    </div>
  );
}
