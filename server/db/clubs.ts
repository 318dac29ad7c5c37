import { asc, eq, inArray, notInArray, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { bikeShares, clubInvites, clubMembers, clubs } from "./schema.ts";

export type ClubRow = typeof clubs.$inferSelect;

export function createClubs(db: Database) {
  const clubsOfBike = db
    .select({ id: bikeShares.clubId })
    .from(bikeShares)
    .where(eq(bikeShares.bikeId, sql.placeholder("bikeId")));
  const raised = { revision: sql`${clubs.revision} + 1` };
  const touchAllOf = db.update(clubs).set(raised).where(inArray(clubs.id, clubsOfBike)).prepare();

  return {
    add: (club: Omit<ClubRow, "revision">) => db.insert(clubs).values(club).run(),
    all: (): ClubRow[] => db.select().from(clubs).orderBy(asc(clubs.name), asc(clubs.id)).all(),
    find: (id: string): ClubRow | undefined =>
      db.select().from(clubs).where(eq(clubs.id, id)).get(),
    withoutOrganiser(): string[] {
      const organisers = db
        .select({ clubId: clubMembers.clubId })
        .from(clubMembers)
        .where(eq(clubMembers.organiser, true));
      const found = db.select({ id: clubs.id }).from(clubs).where(notInArray(clubs.id, organisers));
      return found.all().map(({ id }) => id);
    },
    /** To be called in the transaction that changes what the club's Line-up shows. */
    touch: (id: string) => db.update(clubs).set(raised).where(eq(clubs.id, id)).run(),
    touchAllOf: (bikeId: string) => touchAllOf.run({ bikeId }),
    /** The club with its invites, members and what is shared with it. */
    remove(id: string): void {
      db.delete(bikeShares).where(eq(bikeShares.clubId, id)).run();
      db.delete(clubInvites).where(eq(clubInvites.clubId, id)).run();
      db.delete(clubMembers).where(eq(clubMembers.clubId, id)).run();
      db.delete(clubs).where(eq(clubs.id, id)).run();
    },
  };
}
