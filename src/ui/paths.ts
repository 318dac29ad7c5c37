import type { EntryKind } from "../../shared/schemas/entry.ts";

/** Route patterns, with their link builders below: a screen's address is written here only. */
export const patterns = {
  shed: "/",
  newBike: "/bikes/new",
  bike: "/bikes/:bikeId/*",
  check: "/bikes/:bikeId/check",
  account: "/account",
  syringes: "/syringes",
  signIn: "/sign-in",
  signUp: "/sign-up",
  forgot: "/forgot",
  reset: "/reset",
  verify: "/verify",
} as const;

export const bikePath = (bikeId: string) => `/bikes/${bikeId}`;
export const checkPath = (bikeId: string) => `${bikePath(bikeId)}/check`;
export const logEntryPath = (bikeId: string, kind: EntryKind) => `${bikePath(bikeId)}/log/${kind}`;
