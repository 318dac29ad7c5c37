import { useQuery } from "@tanstack/react-query";
import { previewSummary, type BikeRecord, type NewEntry } from "../../offline/index.ts";

/**
 * Why an entry's hours would not count at once, if so: asked of the same code that will judge them
 * once they are saved.
 */
export function useDoubt({ bikeId, summary }: BikeRecord, entry: NewEntry | null) {
  const { data } = useQuery({
    queryKey: ["doubt", bikeId, entry],
    enabled: entry !== null,
    networkMode: "always",
    retry: false,
    gcTime: 0,
    queryFn: async () => {
      const { doubtful } = (await previewSummary(bikeId, entry!)).hours;
      return doubtful.length > summary.hours.doubtful.length ? doubtful.at(-1)!.why : null;
    },
  });
  return data ?? null;
}
