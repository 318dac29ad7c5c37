/** Every answer about clubs is kept under a key that begins with `clubs`, so that all age as one. */
import { useQuery } from "@tanstack/react-query";
import { clubsQuery } from "../../offline/club-queries.ts";
import { readInvites, readMembers } from "./club-calls.ts";
import { useKeptAnswer } from "./use-kept-answer.ts";

export const useClubs = () => useQuery(clubsQuery);

export const useMembers = (clubId: string) =>
  useKeptAnswer(["clubs", clubId, "members"], () => readMembers(clubId));

export const useInvites = (clubId: string) =>
  useKeptAnswer(["clubs", clubId, "invites"], () => readInvites(clubId));
