import { usualScale, type Scale } from "../../../ui/column-scale.ts";
import type { ColumnReading } from "../../../ui/column-sentence.ts";
import type { DeliveryHistory } from "../history/delivery-history.ts";

/**
 * The Column of the last session, in the syringe it was read from where that holds all of it. Its band is
 * the uncertainty of the comparison, so that band and limit tell how sure the verdict is.
 */
export function columnOfSession({
  lastSession,
  actLimit,
}: Pick<DeliveryHistory, "lastSession" | "actLimit">): ColumnReading & { scale: Scale } {
  if (!lastSession) return { scale: usualScale(null), readingMl: null };
  const { perRunMl, uMl, uRatio, baseline, syringe } = lastSession;
  const baselineMl = baseline?.perRunMl ?? null;
  const fits = syringe && Math.max(perRunMl, baselineMl ?? 0) <= syringe.capacityMl;
  return {
    scale: fits
      ? { maxMl: syringe.capacityMl, graduationMl: syringe.graduationMl }
      : usualScale(perRunMl, baselineMl),
    readingMl: perRunMl,
    uMl: baseline && uRatio !== null ? uRatio * baseline.perRunMl : uMl,
    baselineMl,
    limitMl: baselineMl && actLimit * baselineMl,
  };
}
