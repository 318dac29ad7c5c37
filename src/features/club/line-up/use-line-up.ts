import { useQuery } from "@tanstack/react-query";
import { lineUpQuery, type LineUp } from "../../../offline/club-queries.ts";

/** An unchanged board costs the server next to nothing. */
const EVERY_MS = 60_000;

const bikesOf = ({ bikes }: LineUp) => bikes;

/** The bikes shared with a club, as the server last told of them. */
export const useLineUp = (clubId: string) =>
  useQuery({ ...lineUpQuery(clubId), select: bikesOf, refetchInterval: EVERY_MS });
