import type { ReactNode } from "react";
import type { MeterFormat, Verdict } from "../../../../shared/schemas/entry.ts";
import { formatHours } from "../../../ui/format-hours.ts";
import { formatMl, formatPercent, GIVE_OR_TAKE } from "../../../ui/format-quantity.ts";
import { formatDay } from "../../../ui/format-when.ts";
import { VerdictShape } from "../../../ui/verdict-mark.tsx";
import { verdictWords } from "../../../ui/words.ts";
import type { HistoryPoint } from "../history/history-point.ts";
import { BikeFlags } from "../now/bike-flags.tsx";

interface Props {
  point: HistoryPoint;
  meterFormat: MeterFormat;
}

/** A check in figures, and under it what has to be said of it. */
export function CheckRows({ point, meterFormat }: Props) {
  const { at, atHours, hoursCount, perRunMl, uMl, ratio, uRatio, verdict, flags } = point;
  const figures = `py-2 pr-2 align-top tabular-nums ${verdict ? "" : "text-soft line-through"}`;
  return (
    <>
      <tr className="border-t border-rule">
        <th scope="row" className={`${figures} font-bold`}>
          {formatHours(atHours, meterFormat)}
          {!hoursCount && "?"}
          <span className="block text-sm font-normal">{formatDay(at)}</span>
        </th>
        <td className={figures}>
          {formatMl(perRunMl)}
          <Small>± {formatMl(GIVE_OR_TAKE * uMl)}</Small>
        </td>
        <td className={figures}>
          {ratio === null ? "none" : formatPercent(ratio)}
          {uRatio !== null && <Small>± {formatPercent(GIVE_OR_TAKE * uRatio)}</Small>}
        </td>
        <td className="py-2 align-top leading-tight">
          {verdict ? <VerdictCell verdict={verdict} /> : "Struck, not counted"}
        </td>
      </tr>
      {flags.length > 0 && verdict && (
        <tr>
          <td colSpan={4} className="pb-2 text-sm">
            <BikeFlags flags={flags} />
          </td>
        </tr>
      )}
    </>
  );
}

/** The shape above the words where the column is narrow. */
function VerdictCell({ verdict }: { verdict: Verdict }) {
  return (
    <span className="flex flex-wrap items-center gap-x-2 font-bold">
      <VerdictShape verdict={verdict} />
      {verdictWords[verdict]}
    </span>
  );
}

function Small({ children }: { children: ReactNode }) {
  return <span className="block text-sm font-normal whitespace-nowrap">{children}</span>;
}
