import type { FlagCode } from "../../../../shared/delivery/flags.ts";
import { FlagList } from "../../../ui/flag-list.tsx";

const saidElsewhere: FlagCode[] = [
  "not-closed-out",
  "hours-doubtful",
  "baseline-cannot-settle",
  "no-delivery",
];

/** What has to be said beside the verdict on a bike's page. */
export function BikeFlags({ flags }: { flags: readonly string[] }) {
  return <FlagList flags={flags} saidElsewhere={saidElsewhere} />;
}
