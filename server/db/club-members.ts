import { and, asc, eq, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { clubMembers, clubs, users } from "./schema.ts";

export type MemberRow = typeof clubMembers.$inferSelect;
export type Roles = Pick<MemberRow, "organiser" | "mechanic">;

const roles = { organiser: clubMembers.organiser, mechanic: clubMembers.mechanic };
const membership = { id: clubs.id, name: clubs.name, revision: clubs.revision, ...roles };
const member = { id: users.id, name: users.name, ...roles, joinedAt: clubMembers.joinedAt };

/** A club as one of its members is in it. */
export type Membership = Roles & { id: string; name: string; revision: number };

export function createClubMembers(db: Database) {
  const { placeholder } = sql;
  const one = db
    .select(membership)
    .from(clubMembers)
    .innerJoin(clubs, eq(clubs.id, clubMembers.clubId))
    .where(
      and(
        eq(clubMembers.clubId, placeholder("clubId")),
        eq(clubMembers.userId, placeholder("userId")),
      ),
    )
    .prepare();
  const of = (clubId: string, userId: string) =>
    and(eq(clubMembers.clubId, clubId), eq(clubMembers.userId, userId));

  return {
    find: (clubId: string, userId: string): Membership | undefined => one.get({ clubId, userId }),
    clubsOf: (userId: string): Membership[] =>
      db
        .select(membership)
        .from(clubMembers)
        .innerJoin(clubs, eq(clubs.id, clubMembers.clubId))
        .where(eq(clubMembers.userId, userId))
        .orderBy(asc(clubs.name), asc(clubs.id))
        .all(),
    /** Those who joined first come first. */
    membersOf: (clubId: string) =>
      db
        .select(member)
        .from(clubMembers)
        .innerJoin(users, eq(users.id, clubMembers.userId))
        .where(eq(clubMembers.clubId, clubId))
        .orderBy(asc(clubMembers.joinedAt), asc(users.id))
        .all(),
    add: (row: MemberRow) => db.insert(clubMembers).values(row).run(),
    setRoles: (clubId: string, userId: string, roles: Partial<Roles>) =>
      db.update(clubMembers).set(roles).where(of(clubId, userId)).run(),
    remove: (clubId: string, userId: string) =>
      db.delete(clubMembers).where(of(clubId, userId)).run(),
  };
}
