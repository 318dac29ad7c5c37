import { MAX_OVERFILL, type Syringe } from "../../../../shared/schemas/entry.ts";
import { parseDecimal } from "../../../ui/parse-decimal.ts";

interface Levels {
  startText: string;
  endText: string;
}

/** What is wrong with a run's levels as typed, a sentence each. */
export function levelErrors(
  { startText, endText }: Levels,
  syringe: Pick<Syringe, "capacityMl"> | null,
): { start?: string; end?: string } {
  const start = parseDecimal(startText);
  const end = parseDecimal(endText);
  if (start === null || start < 0) return { start: "Type the level before the run, in mL." };
  if (end === null || end < 0) return { end: "Set the level the oil stands at now." };
  if (end < start) return { end: "The end level is below the start level." };
  const highest = syringe ? syringe.capacityMl * MAX_OVERFILL : Infinity;
  if (end > highest)
    return { end: `This level is far beyond the ${syringe?.capacityMl} mL barrel.` };
  return {};
}
