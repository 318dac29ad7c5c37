import {
  ASSUMED_GRADUATION_ML,
  type Delivery,
} from "../../../../shared/delivery/measure-delivery.ts";
import type { Syringe } from "../../../../shared/schemas/entry.ts";

type Components = Delivery["components"];

/** What makes a delivery uncertain most, as the rider can change it. */
export function largestUncertainty(
  components: Components,
  syringe: Pick<Syringe, "graduationMl"> | null,
  oilTempKnown: boolean,
): string {
  const { readingMl, repeatabilityMl, temperatureMl } = components;
  const largest = Math.max(readingMl, repeatabilityMl, temperatureMl);
  if (largest === readingMl)
    return syringe
      ? `your syringe’s ${syringe.graduationMl} mL marks`
      : `the syringe, which is not known: marks of ${ASSUMED_GRADUATION_ML} mL are assumed`;
  if (largest === repeatabilityMl) return "how one run differs from the next";
  return oilTempKnown ? "the oil’s temperature" : "the oil’s temperature, which was not noted";
}
