import { randomUUID } from "node:crypto";
import { z } from "zod";
import type { LineUpPage } from "../../shared/schemas/club.ts";
import type { BoardRow } from "../db/bike-shares.ts";
import type { Store } from "../db/store.ts";
import { wrongFields } from "../problems.ts";
import { membershipAs } from "./permissions.ts";

/** So many pages are kept as they were last answered. */
const MAX_KEPT = 100;

type Place = Omit<BoardRow, "json">;
const top: Place = { rank: -1, dueInHours: 0, bikeId: "" };

const placeSchema = z.tuple([z.int(), z.number(), z.string()]);

/** A place on the board as it travels; opaque to whoever asks. */
const cursorOf = ({ rank, dueInHours, bikeId }: Place) =>
  Buffer.from(JSON.stringify([rank, dueInHours, bikeId])).toString("base64url");

function placeOf(cursor: string): Place {
  try {
    const [rank, dueInHours, bikeId] = placeSchema.parse(
      JSON.parse(Buffer.from(cursor, "base64url").toString()),
    );
    return { rank, dueInHours, bikeId };
  } catch {
    throw wrongFields({ after: "This is no place on the Line-up." });
  }
}

/** One page as JSON; one row more than it holds is read, to know whether there are more. */
function readPage(store: Store, clubId: string, after: Place, limit: number): string {
  const found = store.bikeShares.board(clubId, after, limit + 1);
  const rows = found.slice(0, limit);
  const last = found.length > limit ? rows.at(-1) : undefined;
  const next = JSON.stringify(last ? cursorOf(last) : null);
  return `{"bikes":[${rows.map(({ json }) => json).join(",")}],"next":${next}}`;
}

/**
 * The Line-up, a page at a time. A board that has not changed is not computed again: its revision
 * is its ETag, and the pages last asked for are kept.
 */
export function createLineUp(store: Store) {
  // Another life of the server may build its answers in another way.
  const life = randomUUID();
  const kept = new Map<string, { revision: number; json: string }>();

  function keptPage(revision: number, clubId: string, after: Place, limit: number): string {
    const key = JSON.stringify([clubId, cursorOf(after), limit]);
    const page = kept.get(key);
    if (page?.revision === revision) return page.json;
    const json = readPage(store, clubId, after, limit);
    kept.delete(key);
    kept.set(key, { revision, json });
    if (kept.size > MAX_KEPT) kept.delete(kept.keys().next().value!);
    return json;
  }

  /** What the board's state is called, and how to get the page: for the club's mechanics. */
  return (accountId: string, clubId: string, { after, limit }: LineUpPage) => {
    const { revision } = membershipAs(store, accountId, clubId, "mechanic");
    const place = after === undefined ? top : placeOf(after);
    return {
      etag: `"${life}.${revision}"`,
      json: () => keptPage(revision, clubId, place, limit),
    };
  };
}
