/**
 * What this phone keeps of the server's word on clubs. The sync asks for it again, and so do the
 * screens. Every key begins with `clubs`. Not part of the first load.
 */
import { queryOptions } from "@tanstack/react-query";
import {
  clubsResponseSchema,
  lineUpResponseSchema,
  MAX_LINE_UP_PAGE,
  type LineUpRow,
} from "../../shared/schemas/club.ts";
import { apiRequest } from "./api-client.ts";
import { apiNewer } from "./api-newer.ts";
import { ApiError } from "./errors.ts";

const isTakenAway = (error: unknown) =>
  error instanceof ApiError && (error.status === 404 || error.status === 403);

/**
 * What the server says, and, with no network, what it last said. What this account may not see any
 * more, it may not see as it was either.
 */
export const keptAnswer = <T>(
  queryKey: readonly string[],
  read: (last: T | undefined) => Promise<T>,
) =>
  queryOptions({
    queryKey,
    async queryFn({ client }): Promise<T> {
      try {
        return await read(client.getQueryData<T>(queryKey));
      } catch (error) {
        const query = client.getQueryCache().find({ queryKey });
        if (isTakenAway(error))
          query?.setState({ data: undefined, dataUpdatedAt: 0, status: "pending" });
        throw error;
      }
    },
    networkMode: "always",
    meta: { persist: true },
  });

/** The clubs this account is in, with what it is there. */
export const clubsQuery = keptAnswer(
  ["clubs"],
  async () => (await apiRequest("/api/clubs", { schema: clubsResponseSchema })).clubs,
);

/** A club's board, under the tag by which the server tells whether it has changed. */
export interface LineUp {
  etag: string | null;
  bikes: LineUpRow[];
}

function readPage(clubId: string, after: string | null, etag: string | null) {
  const query = new URLSearchParams({
    limit: String(MAX_LINE_UP_PAGE),
    ...(after === null ? {} : { after }),
  });
  const path = `/api/clubs/${clubId}/line-up?${query.toString()}`;
  return apiNewer(path, lineUpResponseSchema, etag);
}

/**
 * The whole board, page by page, unless it is as it was. It may change in between: a bike met twice
 * counts as met last, and the first page's tag then brings the board anew the next time.
 */
async function readLineUp(clubId: string, last: LineUp | undefined): Promise<LineUp> {
  const first = await readPage(clubId, null, last?.etag ?? null);
  if (!first) return last!;
  const bikes = new Map<string, LineUpRow>();
  let page = first.content;
  for (;;) {
    for (const bike of page.bikes) bikes.set(bike.bikeId, bike);
    if (page.next === null || page.bikes.length === 0) break;
    page = (await readPage(clubId, page.next, null))!.content;
  }
  return { etag: first.etag, bikes: [...bikes.values()] };
}

/** The bikes shared with a club, for its mechanics. */
export const lineUpQuery = (clubId: string) =>
  keptAnswer<LineUp>(["clubs", clubId, "line-up"], (last) => readLineUp(clubId, last));
