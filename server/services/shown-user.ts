import type { User } from "../../shared/schemas/auth.ts";
import type { UserRow } from "../db/users.ts";

/** What of an account is shown to its owner. */
export const shownUser = ({ id, name, email, verified }: UserRow): User => ({
  id,
  name,
  email,
  verified,
});
