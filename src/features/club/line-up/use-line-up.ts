import { useQuery } from "@tanstack/react-query";
import {
  lineUpResponseSchema,
  MAX_LINE_UP_PAGE,
  type LineUpRow,
} from "../../../../shared/schemas/club.ts";
import { apiRequest } from "../../../offline/index.ts";

/** An unchanged board costs the server next to nothing. */
const EVERY_MS = 60_000;

/** The whole board, page by page. It may change in between: a bike met twice counts as met last. */
async function readLineUp(clubId: string): Promise<LineUpRow[]> {
  const bikes = new Map<string, LineUpRow>();
  let after: string | null = null;
  do {
    const query: string = new URLSearchParams({
      limit: String(MAX_LINE_UP_PAGE),
      ...(after === null ? {} : { after }),
    }).toString();
    const page = await apiRequest(`/api/clubs/${clubId}/line-up?${query}`, {
      schema: lineUpResponseSchema,
      revalidates: true,
    });
    for (const bike of page.bikes) bikes.set(bike.bikeId, bike);
    after = page.bikes.length > 0 ? page.next : null;
  } while (after !== null);
  return [...bikes.values()];
}

/** The bikes shared with a club, as the server last told of them. */
export const useLineUp = (clubId: string) =>
  useQuery({
    queryKey: ["clubs", clubId, "line-up"],
    queryFn: () => readLineUp(clubId),
    networkMode: "always",
    refetchInterval: EVERY_MS,
    meta: { persist: true },
  });
