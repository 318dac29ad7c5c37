import type { Syringe } from "../../../shared/schemas/entry.ts";

/** The syringes to choose from: those in use, and the chosen one should it be retired since. */
export function syringeOptions(syringes: Syringe[], chosen: Syringe | null): Syringe[] {
  const missing = chosen && !syringes.some(({ id }) => id === chosen.id);
  return missing ? [chosen, ...syringes] : syringes;
}
