import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { CheckSummary, Summary } from "../../../shared/schemas/summary.ts";
import { previewSummary, type BikeRecord } from "../../offline/index.ts";
import type { CheckEntry } from "./draft/check-entry.ts";

/** A bike's summary as it would be with a check that is not saved yet. */
interface Preview {
  summary: Summary;
  /** Null where that check could not be counted. */
  check: CheckSummary | null;
}

/** The check that a summary has and the one without it has not. */
function newCheck(before: Summary, after: Summary): CheckSummary | null {
  const known = new Set(before.checks.map(({ entryId }) => entryId));
  return after.checks.find(({ entryId }) => !known.has(entryId)) ?? null;
}

/** Judges on this phone what is not saved yet; `entry` null while there is nothing to judge. */
export function usePreview({ bikeId, summary: before }: BikeRecord, entry: CheckEntry | null) {
  return useQuery({
    queryKey: ["preview", bikeId, before.hours.readAt, before.checks.length, entry],
    enabled: entry !== null,
    networkMode: "always",
    retry: false,
    gcTime: 0,
    placeholderData: entry ? keepPreviousData : undefined,
    queryFn: async (): Promise<Preview> => {
      const summary = await previewSummary(bikeId, entry!);
      return { summary, check: newCheck(before, summary) };
    },
  });
}
