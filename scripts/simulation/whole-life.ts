import { measureDelivery } from "../../shared/delivery/measure-delivery.ts";
import { BASELINE_RUNS_FACTOR } from "../../shared/delivery/plan-runs.ts";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import type { CheckBody } from "../../shared/schemas/entry.ts";
import type { Summary } from "../../shared/schemas/summary.ts";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import type { PlannedCell } from "./cells.ts";
import { rectangular, type Random } from "./random.ts";
import { simulateCheck } from "./simulated-check.ts";

const START_HOURS = 100;
const INTERVAL_HOURS = 20;
const LOSS_PER_HOUR = 0.15 / 100;
/** Past this many hours of wear the pump gives almost nothing. */
const LAST_HOURS = 600;
/** A rider who is told to repeat does so this often before taking the delivery as low. */
const MOST_REPEATS = 5;

/** How often a range was shown for the crossing of the limit, and what it held. */
export interface Ranges {
  shown: number;
  /** The hours at which the pump has truly lost 15 %. */
  holdTrue: number;
  /** The same hours lay before the range. */
  missEarly: number;
  /** The hours at which it falls to 0.85 of the baseline as that was measured. */
  holdMeasured: number;
}

/** What came of one pump's life, in engine hours; the two delays count from 0.92 and 0.85. */
export interface Life {
  /** To the first *repeat*, *stop* or halved interval. */
  warnedAfter: number;
  /** To the first *stop*, or the fifth repeat that did not let the rider ride. */
  stoppedAfter: number;
  ranges: Ranges;
}

/** A pump that is sound until its wear begins, within an interval after its baseline. */
function wearingPump(random: Random) {
  const wearFrom = START_HOURS + INTERVAL_HOURS / 2 + rectangular(random, INTERVAL_HOURS / 2);
  return {
    ratioAt: (hours: number) => Math.max(0, 1 - LOSS_PER_HOUR * Math.max(0, hours - wearFrom)),
    /** When it has lost this fraction. */
    hoursAt: (lost: number) => wearFrom + lost / LOSS_PER_HOUR,
  };
}

type Check = (hours: number, runs: number) => CheckBody;

function checkOf(cell: PlannedCell, ratioAt: (hours: number) => number, random: Random): Check {
  const { nominalMl, syringe } = cell;
  return (hours, runs) => {
    const pump = { trueMl: nominalMl * ratioAt(hours), expectedMl: nominalMl };
    return simulateCheck(pump, runs, syringe, "assumed", random);
  };
}

/** One pump checked every 20 h, or when the product says (`followed`), until it is stopped. */
export function liveUnderProduct(cell: PlannedCell, random: Random, followed: boolean): Life {
  const pump = wearingPump(random);
  const check = checkOf(cell, pump.ratioAt, random);
  const book = logbook().bike({ name: "Moss" });
  book.check(START_HOURS, [], check(START_HOURS, BASELINE_RUNS_FACTOR * cell.plan.runs));
  const ranges: Ranges = { shown: 0, holdTrue: 0, missEarly: 0, holdMeasured: 0 };
  let warnedAt: number | null = null;
  let hours = START_HOURS + INTERVAL_HOURS;
  while (hours < LAST_HOURS) {
    const { summary, warned } = session(book, () => check(hours, cell.plan.runs), hours, followed);
    const { action, trend, due } = summary;
    if (warned) warnedAt ??= hours;
    const measuredRatio = (summary.series[0]?.baseline?.perRunMl ?? 0) / cell.nominalMl;
    if (trend?.range && hours < pump.hoursAt(0.15))
      count(ranges, trend.range, pump.hoursAt(0.15), pump.hoursAt(1 - 0.85 * measuredRatio));
    if (action === "stop" || (followed && action === "repeat")) break;
    hours = followed ? Math.max(due.atHours, hours + 1) : hours + INTERVAL_HOURS;
  }
  return {
    warnedAfter: (warnedAt ?? hours) - pump.hoursAt(0.08),
    stoppedAfter: hours - pump.hoursAt(0.15),
    ranges,
  };
}

/** A check, repeated at once while the product asks for it and the rider follows. */
function session(
  book: ReturnType<typeof logbook>,
  check: () => CheckBody,
  hours: number,
  followed: boolean,
): { summary: Summary; warned: boolean } {
  const mostChecks = followed ? 1 + MOST_REPEATS : 1;
  let warned = false;
  for (let checks = 1; ; checks++) {
    book.check(hours, [], check());
    const summary = summariseLogbook({ ownerId: "owner", entries: book.entries });
    warned ||= summary.action !== "ride" || summary.verdict !== "holding";
    if (summary.action !== "repeat" || checks === mostChecks) return { summary, warned };
  }
}

function count(
  ranges: Ranges,
  { low, high }: { low: number; high: number },
  trueHours: number,
  measuredHours: number,
) {
  ranges.shown += 1;
  ranges.holdTrue += Number(low <= trueHours && trueHours <= high);
  ranges.missEarly += Number(trueHours < low);
  ranges.holdMeasured += Number(low <= measuredHours && measuredHours <= high);
}

/** One pump whose single run every 20 h is held to a bare limit. Answers the hours from 0.85. */
export function liveUnderBareLimit(cell: PlannedCell, limit: number, random: Random): number {
  const pump = wearingPump(random);
  const check = checkOf(cell, pump.ratioAt, random);
  const perRunMl = (hours: number) =>
    measureDelivery(check(hours, 1), null).delivery?.perRunMl ?? 0;
  const baseline = perRunMl(START_HOURS);
  let hours = START_HOURS + INTERVAL_HOURS;
  while (hours < LAST_HOURS && perRunMl(hours) / baseline >= limit) hours += INTERVAL_HOURS;
  return hours - pump.hoursAt(0.15);
}
