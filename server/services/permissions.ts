/** Who may do what with which bike and in which club: decided here and nowhere else. */
import type { Member } from "../../shared/schemas/club.ts";
import type { EntryKind } from "../../shared/schemas/entry.ts";
import type { BikeAccess } from "../../shared/schemas/sync.ts";
import type { Membership } from "../db/club-members.ts";
import type { Store } from "../db/store.ts";
import { notFound } from "../problems.ts";

/** What this account is to this bike; null for a bike it may not know of, as for one that is not. */
export function accessTo(store: Store, accountId: string, bikeId: string): BikeAccess | null {
  if (store.bikes.ownerOf(bikeId) === accountId) return "owner";
  return store.bikeShares.isSeenByMechanic(bikeId, accountId) ? "mechanic" : null;
}

/** Erasing, and saying who else may see it, are the owner's alone. */
export function assertOwner(store: Store, accountId: string, bikeId: string): void {
  if (accessTo(store, accountId, bikeId) !== "owner") throw notFound();
}

/** What a bike is called and how it is judged, its owner says. */
export const mayWrite = (access: BikeAccess, kind: EntryKind) =>
  access === "owner" || kind !== "bike";

/** A mechanic takes back what the mechanic wrote. */
export const mayStrike = (access: BikeAccess, accountId: string, authorId: string) =>
  access === "owner" || authorId === accountId;

/** The bikes whose entries a phone is sent: the account's own, and those it lists and may read. */
export function bikesToSend(store: Store, accountId: string, listed: readonly string[]) {
  const bikeIds = new Set([...store.bikes.idsOf(accountId), ...listed]);
  return [...bikeIds].flatMap((bikeId) => {
    const access = accessTo(store, accountId, bikeId);
    return access === null ? [] : [{ bikeId, access }];
  });
}

/** The account's membership of a club; a club that it is not in is not found, nor one where it lacks the role. */
export function membershipAs(
  store: Store,
  accountId: string,
  clubId: string,
  role: "member" | "organiser" | "mechanic",
): Membership {
  const membership = store.clubMembers.find(clubId, accountId);
  if (!membership || (role !== "member" && !membership[role])) throw notFound();
  return membership;
}

/** Organisers see every member; others themselves, and those who have something to do for them. */
export const maySeeMember = (viewer: Membership, viewerId: string, member: Member) =>
  viewer.organiser || member.organiser || member.mechanic || member.id === viewerId;

/** Organisers remove anyone; everyone may leave. */
export function assertMayRemove(store: Store, accountId: string, clubId: string, userId: string) {
  membershipAs(store, accountId, clubId, accountId === userId ? "member" : "organiser");
}
