import { compareToBaseline, type Volume } from "../../../../shared/delivery/compare-to-baseline.ts";
import type { Delivery } from "../../../../shared/delivery/measure-delivery.ts";
import type { LogEntryOf, Verdict } from "../../../../shared/schemas/entry.ts";
import type { Baseline } from "../../../../shared/schemas/summary.ts";

/** One check as the chart draws it and the table lists it. */
export interface HistoryPoint {
  entryId: string;
  at: string;
  /** Lifetime hours. */
  atHours: number;
  /** False where the hour reading is doubted: such a check has no place on the chart. */
  hoursCount: boolean;
  /** Index of its series. */
  series: number;
  perRunMl: number;
  uMl: number;
  /** Of the baseline the series is held to; null where there is none. */
  ratio: number | null;
  uRatio: number | null;
  /** Of its whole session; null for a struck check, which is judged no more. */
  verdict: Verdict | null;
  flags: string[];
}

export function volumeOf(entry: LogEntryOf<"check">, delivery: Delivery): Volume {
  const { perRunMl, uMl, uScaleMl } = delivery;
  return { perRunMl, uMl, uScaleMl, syringeId: entry.body.syringe?.id ?? null };
}

/** As a fraction of the baseline. One that belongs to the baseline is unsure by its own reading alone. */
export function ofBaseline(
  volume: Volume,
  baseline: Baseline | null,
  isBaseline: boolean,
): Pick<HistoryPoint, "ratio" | "uRatio"> {
  if (!baseline) return { ratio: null, uRatio: null };
  if (!isBaseline) return compareToBaseline(volume, baseline);
  return { ratio: volume.perRunMl / baseline.perRunMl, uRatio: volume.uMl / baseline.perRunMl };
}
