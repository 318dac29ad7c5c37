import type { ReactNode } from "react";
import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import type { CheckBody, Sequence } from "../../../../shared/schemas/entry.ts";
import type { CheckSummary } from "../../../../shared/schemas/summary.ts";
import {
  formatMl,
  formatMlGiveOrTake,
  formatPercent,
  GIVE_OR_TAKE,
} from "../../../ui/format-quantity.ts";
import { largestUncertainty } from "./largest-uncertainty.ts";

interface Props {
  check: CheckSummary;
  body: CheckBody;
  sequence: Sequence | null;
}

/** The numbers behind the verdict, each with how far it may be off. */
export function CheckFigures({ check, body, sequence }: Props) {
  const { perRunMl, uMl, ratio, uRatio, baselineMl, runsCounted } = check;
  const { delivery } = measureDelivery(body, sequence);
  const sessionMl = ratio !== null && baselineMl ? ratio * baselineMl : perRunMl;
  return (
    <>
      <dl className="flex flex-col gap-2 text-lg">
        <Figure name="Delivery a run">
          <strong className="text-[min(1.5rem,9vw)]">{formatMlGiveOrTake(perRunMl, uMl)}</strong>
        </Figure>
        {ratio !== null && uRatio !== null && (
          <Figure name="Of baseline">
            <strong className="text-[min(1.5rem,9vw)]">
              {formatPercent(ratio)} ± {formatPercent(GIVE_OR_TAKE * uRatio)}
            </strong>
          </Figure>
        )}
        {Math.abs(sessionMl - perRunMl) > 0.005 && (
          <Figure name="Together">
            {formatMl(sessionMl)}: judged with the other checks of this hour
          </Figure>
        )}
        <Figure name="Runs counted">{runsCounted}</Figure>
      </dl>
      {delivery && (
        <p className="text-lg">
          Most of the ± comes from{" "}
          {largestUncertainty(delivery.components, body.syringe, body.oilTempC !== undefined)}.
        </p>
      )}
    </>
  );
}

function Figure({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="flex flex-wrap items-baseline gap-x-3">
      <dt className="text-soft">{name}</dt>
      <dd className="tabular-nums">{children}</dd>
    </div>
  );
}
