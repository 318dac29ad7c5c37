import type { Spoiler } from "../../shared/schemas/entry.ts";

/** What may have spoiled a reading, as it stands in a log. */
export const spoilerWords: Record<Spoiler, string> = {
  "hose-in-oil": "hose in the oil",
  "barrel-not-upright": "barrel not upright",
  "tip-leaked": "tip leaked",
  "eye-off-level": "eye above or below the level",
  "oil-film": "film of oil left in the barrel",
  bubbles: "bubbles in the line",
  "cold-oil": "cold oil",
  "weak-battery": "weak battery",
  "low-tank": "low tank",
  "drip-wait-varied": "drip wait varied",
};
