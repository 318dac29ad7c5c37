/** `npm run simulate`: how often the product is right about pumps whose true delivery is known. */
import { USUAL_ACT_DROP } from "../shared/schemas/entry.ts";
import { cells, plannedCells, type PlannedCell } from "./simulation/cells.ts";
import { countDecisions, singleRunRatios } from "./simulation/count-decisions.ts";
import { seededRandom, type Random } from "./simulation/random.ts";
import type { Reading } from "./simulation/simulated-check.ts";
import { liveUnderBareLimit, liveUnderProduct, type Ranges } from "./simulation/whole-life.ts";

const CHECKS = 50_000;
/** False stops are rare: so many sound pumps tell how rare. */
const SOUND_CHECKS = 400_000;
const LIVES = 2_000;
const TRUE_RATIOS = [1, 0.95, 0.92, 0.9, 0.85, 0.8, 0.75];
const SEED = 1;

const row = (...columns: (string | number)[]) => console.log(`| ${columns.join(" | ")} |`);

function heading(...columns: string[]) {
  row(...columns);
  row(...columns.map(() => "---"));
}

const nameOf = ({ nominalMl, syringe }: (typeof cells)[number]) =>
  `${nominalMl} mL, ${syringe.capacityMl}/${syringe.graduationMl}`;

const percent = (share: number) => {
  const value = 100 * share;
  return value > 0 && value < 0.1 ? value.toFixed(3) : value.toFixed(1);
};

const reasons = {
  "barrel-too-small": "the barrel cannot take one run",
  "marks-too-coarse": "no number of runs will do: the marks are too coarse",
};

function printDecisions(random: Random) {
  heading(
    "delivery, syringe",
    "runs",
    "true ratio",
    ...["holding", "dropping", "low", "ride", "repeat", "stop"].map((word) => `${word} %`),
  );
  for (const cell of cells) {
    if (cell.plan.runs === null) {
      row(nameOf(cell), "–", reasons[cell.plan.reason], ...Array<string>(6).fill(""));
      continue;
    }
    for (const ratio of TRUE_RATIOS) {
      const shares = countDecisions(cell as PlannedCell, ratio, CHECKS, random);
      row(nameOf(cell), cell.plan.runs, ratio.toFixed(2), ...Object.values(shares).map(percent));
    }
  }
}

function printReadings(random: Random) {
  heading("delivery, syringe", "level read", "ride % at 1.00", "ride % at 0.85", "stop % at 0.75");
  const words: Record<Reading, string> = {
    assumed: "anywhere within half a mark (assumed)",
    toHalfMarks: "to the nearest half mark",
    toMarks: "to the nearest mark",
    worse: "within half a mark, then rounded to half marks",
  };
  for (const cell of plannedCells)
    for (const [reading, name] of Object.entries(words)) {
      const at = (ratio: number) => countDecisions(cell, ratio, CHECKS, random, reading as Reading);
      row(nameOf(cell), name, ...[at(1).ride, at(0.85).ride, at(0.75).stop].map(percent));
    }
}

const quantile = (sorted: number[], share: number) =>
  String(Math.round(sorted[Math.floor(share * (sorted.length - 1))] ?? Number.NaN));

/** The earliest of twenty, the middle, and what nine of ten keep within, h. */
function spread(hours: number[]) {
  const sorted = [...hours].sort((a, b) => a - b);
  return [0.05, 0.5, 0.9].map((share) => quantile(sorted, share)).join(", ");
}

const times = <T>(make: () => T) => Array.from({ length: LIVES }, make);

function printLives(random: Random) {
  heading(
    "delivery, syringe",
    "checks",
    "hours from 0.92 to the first warning",
    "hours from 0.85 to the first stop",
    "range holds the true crossing %",
    "true one before it %",
    "range holds the crossing of 0.85 of the measured baseline %",
  );
  for (const cell of plannedCells)
    for (const followed of [false, true]) {
      const lives = times(() => liveUnderProduct(cell, random, followed));
      const share = (what: keyof Ranges) => {
        const total = (of: keyof Ranges) => lives.reduce((sum, { ranges }) => sum + ranges[of], 0);
        return percent(total(what) / total("shown"));
      };
      row(
        nameOf(cell),
        followed ? "when due" : "every 20 h",
        spread(lives.map(({ warnedAfter }) => warnedAfter)),
        spread(lives.map(({ stoppedAfter }) => stoppedAfter)),
        share("holdTrue"),
        share("missEarly"),
        share("holdMeasured"),
      );
    }
}

function printBareLimit(random: Random) {
  heading(
    "delivery, syringe",
    "false stops of the product, in 10,000 checks",
    "false stops of a single run held to 0.85, in 10,000",
    "limit with as few false stops",
    "hours from 0.85 to its first stop",
  );
  for (const cell of plannedCells) {
    const { stop } = countDecisions(cell, 1, SOUND_CHECKS, random);
    const ratios = singleRunRatios(cell, SOUND_CHECKS, random);
    const limit = ratios[Math.round(SOUND_CHECKS * stop)] ?? 0;
    const bareStops = ratios.filter((ratio) => ratio < 1 - USUAL_ACT_DROP).length / SOUND_CHECKS;
    row(
      nameOf(cell),
      (10_000 * stop).toFixed(1),
      (10_000 * bareStops).toFixed(1),
      limit.toFixed(3),
      spread(times(() => liveUnderBareLimit(cell, limit, random))),
    );
  }
}

for (const [title, print] of [
  [`Verdicts and actions in ${CHECKS} checks each`, printDecisions],
  ["How the level is read", printReadings],
  [
    `${LIVES} pumps each that lose 15 % in 100 h (the earliest of twenty, the middle, nine of ten)`,
    printLives,
  ],
  ["The same pumps by a single run, held to a bare limit", printBareLimit],
] as const) {
  console.log(`\n${title}\n`);
  print(seededRandom(SEED));
}
