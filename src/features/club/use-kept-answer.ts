import { useQuery, useQueryClient, type UseQueryResult } from "@tanstack/react-query";
import { keptAnswer } from "../../offline/club-queries.ts";

export const useKeptAnswer = <T>(
  queryKey: readonly string[],
  read: () => Promise<T>,
): UseQueryResult<T> => useQuery(keptAnswer(queryKey, read));

/** Asks anew for all that was said of clubs; resolves when it is here. */
export function useAskAnew() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: ["clubs"] });
}
