/** Not part of the first load. */
import { useDrafts } from "./drafts.ts";
import { useBikes } from "./logbook-queries.ts";
import { isTestDay } from "./test-day.ts";
import type { Draft } from "./types.ts";

/** Forms half filled in of bikes that are no longer on this phone: no log takes them any more. */
export function useLeftDrafts(): Draft[] {
  const { data: drafts } = useDrafts();
  const { data: bikes } = useBikes();
  if (!drafts || !bikes) return [];
  const here = new Set(bikes.map(({ bikeId }) => bikeId));
  return drafts.filter((draft) => !isTestDay(draft) && !here.has(draft.bikeId));
}
