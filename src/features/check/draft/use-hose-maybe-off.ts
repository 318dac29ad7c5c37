import { useOpenChecks, type BikeRecord } from "../../../offline/index.ts";

/** Whether the bike must not be started: a check was saved, left or given up without its close-out. */
export function useHoseMaybeOff({ bikeId, summary }: BikeRecord): boolean {
  const openChecks = useOpenChecks();
  return (
    summary.flags.includes("not-closed-out") ||
    openChecks.some((check) => check.bikeId === bikeId && check.hoseMaybeOff)
  );
}
