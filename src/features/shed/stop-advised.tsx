import type { BikeRecord } from "../../offline/index.ts";
import { StopAdvised } from "../../ui/stop-advised.tsx";

/** Seldom needed, so it is not in the first load. */
export default function StopAdvisedOn({ bike: { advice } }: { bike: BikeRecord }) {
  return advice && <StopAdvised advice={advice} />;
}
