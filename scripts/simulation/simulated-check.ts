import { REPEATABILITY } from "../../shared/delivery/measure-delivery.ts";
import { runsPerFill } from "../../shared/delivery/runs-per-fill.ts";
import { ASSUMED_OIL_TEMP_C, volumeAt15C } from "../../shared/delivery/volume-at-15c.ts";
import type { CheckBody, Run, Syringe } from "../../shared/schemas/entry.ts";
import { normal, rectangular, type Random } from "./random.ts";

/** How a level is read: `error` is where the eye may be, `step` what it is then rounded to, marks. */
export const readings = {
  /** What the measurement assumes: anywhere within half a mark of the truth. */
  assumed: { error: 1 / 2, step: 0 },
  /** To the nearest half mark, as the app's steppers do. */
  toHalfMarks: { error: 0, step: 1 / 2 },
  /** To the nearest mark only. */
  toMarks: { error: 0, step: 1 },
  /** More than is assumed: the eye's error and the rounding on top of it. */
  worse: { error: 1 / 2, step: 1 / 2 },
} as const;

export type Reading = keyof typeof readings;

/** No temperature is written down; the oil is this near to what it is taken to be, K. */
const OIL_TEMP_HALF_WIDTH_K = 10;

export interface Pump {
  /** What it truly delivers in a run, mL at 15 °C. */
  trueMl: number;
  /** What the rider expects of it, by which the barrel is emptied in time. */
  expectedMl: number;
}

function read(levelMl: number, graduationMl: number, reading: Reading, random: Random): number {
  const { error, step } = readings[reading];
  const seen = levelMl / graduationMl + rectangular(random, error);
  return graduationMl * (step > 0 ? Math.round(seen / step) * step : seen);
}

/**
 * A check of `runs` runs as a careful rider makes it: a fill starts on a mark, as well as the eye
 * can set it, and goes on while the barrel takes another run.
 */
export function simulateCheck(
  pump: Pump,
  runs: number,
  syringe: Syringe,
  reading: Reading,
  random: Random,
): CheckBody {
  const { graduationMl } = syringe;
  const { error, step } = readings[reading];
  const oilTempC = ASSUMED_OIL_TEMP_C + rectangular(random, OIL_TEMP_HALF_WIDTH_K);
  const ranMl = pump.trueMl / volumeAt15C(1, oilTempC);
  const perFill = runsPerFill(syringe.capacityMl, pump.expectedMl);
  const made: Run[] = [];
  let [levelMl, startMl] = [0, 0];
  for (let run = 0; run < runs; run++) {
    if (run % perFill === 0) {
      startMl = 0;
      levelMl = graduationMl * (rectangular(random, error) + rectangular(random, step / 2));
    }
    levelMl += ranMl * (1 + REPEATABILITY * normal(random));
    const endMl = Math.max(startMl, read(levelMl, graduationMl, reading, random));
    made.push({ startMl, endMl });
    startMl = endMl;
  }
  return { syringe, runs: made, closedOut: true };
}
