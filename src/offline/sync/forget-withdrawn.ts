import type { QueryClient, QueryKey } from "@tanstack/react-query";
import type { Club } from "../../../shared/schemas/club.ts";
import { clubsQuery, lineUpQuery } from "../club-queries.ts";
import type { Phone } from "../logbook/phone.ts";
import { clubsOnTestDay, endTestDay, keepShared } from "../test-day.ts";

interface Rechecking {
  client: QueryClient;
  phone: Phone;
  /** False once another account has signed in: what is answered is then for that one. */
  isCurrent: () => boolean;
}

/** Whether this account may still see what was said under this key. */
function maySee([, clubId, what]: QueryKey, clubs: readonly Club[]): boolean {
  if (clubId === undefined || clubId === "shares") return true;
  const club = clubs.find(({ id }) => id === clubId);
  if (what === "line-up") return club?.mechanic === true;
  if (what === "invites") return club?.organiser === true;
  return club !== undefined;
}

const clubsOnBoard = (client: QueryClient): string[] =>
  client
    .getQueryCache()
    .findAll({ queryKey: ["clubs"] })
    .flatMap(({ queryKey: [, clubId, what] }) => (what === "line-up" ? [String(clubId)] : []));

/** The board anew, and the test day without whatever is on it no more. */
async function recheckLineUp({ client, phone, isCurrent }: Rechecking, clubId: string) {
  const { bikes } = await client.fetchQuery({ ...lineUpQuery(clubId), retry: false });
  if (isCurrent()) await keepShared(phone, clubId, new Set(bikes.map(({ bikeId }) => bikeId)));
}

/**
 * Asks the server again for the clubs and their boards, whether a screen shows them or not, and
 * drops what this account may see no more. What was typed and not saved stays among the drafts.
 */
export async function forgetWithdrawn(rechecking: Rechecking): Promise<void> {
  const { client, phone, isCurrent } = rechecking;
  const clubs = await client.fetchQuery({ ...clubsQuery, retry: false });
  if (!isCurrent()) return;
  client.removeQueries({
    queryKey: ["clubs"],
    predicate: ({ queryKey }) => !maySee(queryKey, clubs),
  });
  for (const clubId of new Set([...clubsOnBoard(client), ...(await clubsOnTestDay(phone))])) {
    if (!isCurrent()) return;
    if (maySee(lineUpQuery(clubId).queryKey, clubs)) await recheckLineUp(rechecking, clubId);
    else await endTestDay(clubId);
  }
}
