import { sharesResponseSchema, type Share } from "../../../../shared/schemas/club.ts";
import { apiRequest, ApiError } from "../../../offline/index.ts";
import { useKeptAnswer } from "../use-kept-answer.ts";

const sharesApi = (bikeId: string) => `/api/bikes/${bikeId}/shares`;

/** A bike that the server does not have yet is shared with nobody. */
async function readShares(bikeId: string): Promise<Share[]> {
  try {
    return (await apiRequest(sharesApi(bikeId), { schema: sharesResponseSchema })).shares;
  } catch (error) {
    if (error instanceof ApiError && error.status === 404) return [];
    throw error;
  }
}

/** The clubs that see a bike, and who of them. */
export const useShares = (bikeId: string) =>
  useKeptAnswer(["clubs", "shares", bikeId], () => readShares(bikeId));

export const changeShare = (bikeId: string, clubId: string, shared: boolean) =>
  apiRequest(`${sharesApi(bikeId)}/${clubId}`, { method: shared ? "PUT" : "DELETE" });
