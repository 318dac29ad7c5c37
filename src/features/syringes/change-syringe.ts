import { v7 as makeId } from "uuid";
import { retireSyringe, saveSyringe, type Syringe } from "../../offline/index.ts";

/**
 * Saves a changed syringe. Its scale's error cancels between checks made with the same syringe, so
 * one with other marks must not go on under the same id.
 */
export async function changeSyringe(before: Syringe, changed: Syringe): Promise<void> {
  const sameScale =
    before.capacityMl === changed.capacityMl && before.graduationMl === changed.graduationMl;
  if (sameScale) return saveSyringe(changed);
  await saveSyringe({ ...changed, id: makeId() });
  await retireSyringe(before);
}
