import type { CheckBody, Run, Sequence } from "../schemas/entry.ts";
import { chiSquaredLimitPerDegree } from "./chi-squared-limit.ts";
import type { FlagCode } from "./flags.ts";
import { readingUncertaintyMl } from "./reading-uncertainty-ml.ts";
import { rectangularUncertainty, rootSumOfSquares } from "./root-sum-of-squares.ts";
import { syringeToleranceMl } from "./syringe-tolerance-ml.ts";
import { ASSUMED_OIL_TEMP_C, OIL_EXPANSION_PER_K, volumeAt15C } from "./volume-at-15c.ts";

/** How much one run differs from the next, as a fraction: common practice, no published source. */
export const REPEATABILITY = 0.02;
/** Marks assumed where the syringe is not known, mL. */
export const ASSUMED_GRADUATION_ML = 0.2;
/** A run whose length differs by more than this fraction is of another sequence. */
const LENGTH_TOLERANCE = 0.2;
/** How well a temperature is known, ± K: written down, or taken as ASSUMED_OIL_TEMP_C. */
const READ_TEMP_HALF_WIDTH_K = 1;
const ASSUMED_TEMP_HALF_WIDTH_K = 10;

export interface Delivery {
  /** Mean of the counted runs, mL a run at 15 °C. */
  perRunMl: number;
  /** Its standard uncertainty, mL, without the scale's part. */
  uMl: number;
  /** The scale's part: it cancels between checks made with the same syringe. */
  uScaleMl: number;
  /** The parts of `uMl`, mL. */
  components: { readingMl: number; repeatabilityMl: number; temperatureMl: number };
  /** Standard deviation of one run, as a fraction of the delivery. */
  repeatability: number;
  runsCounted: number;
  fills: number;
}

type Measured = Pick<CheckBody, "syringe" | "runs" | "oilTempC">;
type Rhythm = Pick<Sequence, "seconds" | "rhythm">;

const volumeOf = (run: Run) => ("deliveredMl" in run ? run.deliveredMl : run.endMl - run.startMl);

function isOtherSequence(run: Run, sequence: Rhythm | null): boolean {
  if ("deliveredMl" in run || !sequence) return false;
  const otherLength =
    run.seconds !== undefined &&
    Math.abs(run.seconds - sequence.seconds) > LENGTH_TOLERANCE * sequence.seconds;
  return otherLength || (run.rhythm !== undefined && run.rhythm !== sequence.rhythm);
}

/** Volumes by barrel fill: a run that starts where the counted one before it ended shares its fill. */
function groupByFill(runs: readonly Run[], counts: (run: Run) => boolean): number[][] {
  const fills: number[][] = [];
  let previous: Run | undefined;
  for (const run of runs) {
    if (counts(run)) {
      const goesOn =
        previous !== undefined &&
        counts(previous) &&
        "endMl" in previous &&
        "startMl" in run &&
        Math.abs(run.startMl - previous.endMl) < 1e-9;
      if (goesOn) fills.at(-1)?.push(volumeOf(run));
      else fills.push([volumeOf(run)]);
    }
    previous = run;
  }
  return fills;
}

/** Standard deviation of one run, mL, and whether the runs scatter beyond what is assumed. */
function runDeviation(volumes: number[], fills: number, graduationMl: number) {
  const n = volumes.length;
  const mean = volumes.reduce((sum, volume) => sum + volume, 0) / n;
  const assumed = REPEATABILITY * mean;
  if (n < 2) return { deviationMl: assumed, scatters: false };
  const observedVariance = volumes.reduce((sum, volume) => sum + (volume - mean) ** 2, 0) / (n - 1);
  // In one fill, neighbouring runs share a reading, which makes their difference vary more.
  const marksVariance = (graduationMl ** 2 / 6) * (fills === 1 ? 1 + 1 / n : 1);
  const explained = chiSquaredLimitPerDegree(n - 1) * (marksVariance + assumed ** 2);
  return observedVariance > explained
    ? { deviationMl: Math.sqrt(observedVariance - marksVariance), scatters: true }
    : { deviationMl: assumed, scatters: false };
}

/** An unknown syringe is taken as read above half its capacity, in ISO 7886-1's wider class. */
const UNKNOWN_SYRINGE_TOLERANCE = 0.05;

function scaleToleranceMl(syringe: Measured["syringe"], fillMl: number): number {
  return syringe
    ? syringeToleranceMl(syringe.capacityMl, fillMl)
    : UNKNOWN_SYRINGE_TOLERANCE * fillMl;
}

function flagsOf(check: Measured, sequence: Rhythm | null): FlagCode[] {
  const { syringe, runs } = check;
  const flags: FlagCode[] = [];
  if (!syringe) flags.push("syringe-unknown");
  if (syringe && runs.some((run) => "endMl" in run && run.endMl > syringe.capacityMl))
    flags.push("above-capacity");
  if (runs.some((run) => run.void)) flags.push("void-runs");
  if (runs.some((run) => !run.void && isOtherSequence(run, sequence))) flags.push("other-sequence");
  return flags;
}

/**
 * What a check's runs say the pump delivers in one run, and how sure that is.
 *
 * Formula: V = Σ(end − start)/n over the counted runs, brought to 15 °C; its uncertainty is the root
 * sum of squares of the marks (`readingUncertaintyMl`), of the runs' repeatability s/√n, and of the
 * oil's temperature (±1 K where written down, ±10 K where taken as 20 °C, rectangular). s is 2 % of
 * V unless the runs scatter more than marks and 2 % explain (χ², 95 %); then it is what they show,
 * less the marks' share. The scale's tolerance at each fill's volume is kept apart.
 * Units: mL, seconds, °C. Sources: GUM (JCGM 100), ISO 7886-1, API MPMS 11.1.
 * Edges: void runs and runs of another length (over 20 %) or rhythm than the bike's sequence are not
 * counted; a run given as a volume alone is a fill of its own; nothing to count → `delivery` null
 * and the flag *nothing-to-count*.
 *
 * @example measureDelivery({ syringe: { …capacityMl: 2.5, graduationMl: 0.1 },
 *   runs: [{ startMl: 0, endMl: 1 }] }, null) // delivery: { perRunMl: 0.996, uMl: 0.0455, … }
 */
export function measureDelivery(
  check: Measured,
  sequence: Rhythm | null,
): { delivery: Delivery | null; flags: FlagCode[] } {
  const flags = flagsOf(check, sequence);
  const fillVolumes = groupByFill(
    check.runs,
    (run) => !run.void && !isOtherSequence(run, sequence),
  );
  const volumes = fillVolumes.flat();
  const runs = volumes.length;
  if (runs === 0) return { delivery: null, flags: [...flags, "nothing-to-count"] };

  const fills = fillVolumes.length;
  const graduationMl = check.syringe?.graduationMl ?? ASSUMED_GRADUATION_ML;
  const totals = fillVolumes.map((fill) => fill.reduce((sum, volume) => sum + volume, 0));
  const readMl = totals.reduce((sum, total) => sum + total, 0) / runs;
  const { deviationMl, scatters } = runDeviation(volumes, fills, graduationMl);
  if (scatters) flags.push("runs-scatter");

  const perRunMl = volumeAt15C(readMl, check.oilTempC ?? ASSUMED_OIL_TEMP_C);
  const to15C = volumeAt15C(1, check.oilTempC ?? ASSUMED_OIL_TEMP_C);
  const components = {
    readingMl: to15C * readingUncertaintyMl({ fills, graduationMl, runs }),
    repeatabilityMl: (to15C * deviationMl) / Math.sqrt(runs),
    temperatureMl:
      OIL_EXPANSION_PER_K *
      perRunMl *
      rectangularUncertainty(
        check.oilTempC === undefined ? ASSUMED_TEMP_HALF_WIDTH_K : READ_TEMP_HALF_WIDTH_K,
      ),
  };
  // One scale reads every fill, so its error adds up rather than averaging out.
  const toleranceMl = totals.reduce(
    (sum, total) => sum + scaleToleranceMl(check.syringe, total),
    0,
  );
  const delivery = {
    perRunMl,
    uMl: rootSumOfSquares(...Object.values(components)),
    uScaleMl: (to15C * rectangularUncertainty(toleranceMl)) / runs,
    components,
    repeatability: readMl > 0 ? deviationMl / readMl : REPEATABILITY,
    runsCounted: runs,
    fills,
  };
  return { delivery, flags };
}
