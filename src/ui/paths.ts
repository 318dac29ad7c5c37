import type { EntryKind } from "../../shared/schemas/entry.ts";
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";

/** Route patterns, with their link builders below: a screen's address is written here only. */
export const patterns = {
  shed: "/",
  newBike: "/bikes/new",
  bike: "/bikes/:bikeId/*",
  check: "/bikes/:bikeId/check/*",
  share: "/bikes/:bikeId/share",
  clubs: "/clubs",
  club: "/clubs/:clubId/*",
  testDayBike: "/clubs/:clubId/test-day/:bikeId",
  account: "/account",
  changeEmail: "/account/email",
  changePassword: "/account/password",
  devices: "/account/devices",
  ownData: "/account/data",
  deleteAccount: "/account/delete",
  syringes: "/syringes",
  signIn: "/sign-in",
  signUp: "/sign-up",
  forgot: "/forgot",
  ...mailedPages,
} as const;

export const bikePath = (bikeId: string) => `/bikes/${bikeId}`;
export const checkPath = (bikeId: string) => `${bikePath(bikeId)}/check`;
/** Ticks off what was left open after a check, whether that check was saved or abandoned. */
export const closeOutPath = (bikeId: string) => `${checkPath(bikeId)}/close-out`;
export const checkResultPath = (bikeId: string, entryId: string) =>
  `${checkPath(bikeId)}/result/${entryId}`;
export const logEntryPath = (bikeId: string, kind: EntryKind) => `${bikePath(bikeId)}/log/${kind}`;
/** The form of a kind, filled in from an entry that the server did not accept. */
export const mendEntryPath = (bikeId: string, kind: EntryKind, entryId: string) =>
  `${logEntryPath(bikeId, kind)}?mends=${entryId}`;
/** With which clubs the bike is shared, and who may see it. */
export const sharePath = (bikeId: string) => `${bikePath(bikeId)}/share`;
/** A club: for its mechanics the Line-up. */
export const clubPath = (clubId: string) => `${patterns.clubs}/${clubId}`;
export const membersPath = (clubId: string) => `${clubPath(clubId)}/members`;
export const testDayPath = (clubId: string) => `${clubPath(clubId)}/test-day`;
export const testDayBikePath = (clubId: string, bikeId: string) =>
  `${testDayPath(clubId)}/${bikeId}`;
export const bikeDetailsPath = (bikeId: string) => `${bikePath(bikeId)}/details`;
