import { planRuns, type PlannedRuns } from "../../shared/delivery/plan-runs.ts";
import { usualSequences } from "../../shared/delivery/usual-sequences.ts";
import { USUAL_ACT_DROP, type Syringe } from "../../shared/schemas/entry.ts";

/** What is simulated: a usual sequence caught with a syringe, with as many runs as are planned. */
export interface Cell {
  nominalMl: number;
  syringe: Syringe;
  plan: PlannedRuns;
}

export type PlannedCell = Cell & { plan: Extract<PlannedRuns, { runs: number }> };

const barrels = [
  [2.5, 0.1],
  [5, 0.2],
  [10, 0.5],
] as const;

export const syringes: Syringe[] = barrels.map(([capacityMl, graduationMl]) => {
  const label = `${capacityMl}/${graduationMl} mL`;
  return { id: label, label, capacityMl, graduationMl };
});

const byDelivery = usualSequences.map(({ nominalMl }) => nominalMl).sort((a, b) => a - b);

export const cells: Cell[] = byDelivery.flatMap((nominalMl) =>
  syringes.map((syringe) => ({
    nominalMl,
    syringe,
    plan: planRuns({
      expectedMl: nominalMl,
      syringe,
      uBaselineRelative: null,
      actDrop: USUAL_ACT_DROP,
    }),
  })),
);

export const plannedCells = cells.filter((cell): cell is PlannedCell => cell.plan.runs !== null);
