import { useQuery, useQueryClient, type UseQueryResult } from "@tanstack/react-query";

/** What the server says, and, with no network, what it last said. */
export const useKeptAnswer = <T>(
  queryKey: readonly string[],
  read: () => Promise<T>,
): UseQueryResult<T> =>
  useQuery({ queryKey, queryFn: read, networkMode: "always", meta: { persist: true } });

/** Asks anew for all that was said of clubs; resolves when it is here. */
export function useAskAnew() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: ["clubs"] });
}
