import { z } from "zod";
import {
  changeEmailSchema,
  changePasswordSchema,
  deleteAccountSchema,
} from "../../../shared/schemas/account.ts";
import {
  requestPasswordResetSchema,
  resetPasswordSchema,
  signInSchema,
  signUpSchema,
  tokenSchema,
} from "../../../shared/schemas/auth.ts";
import { memberRolesSchema, newClubSchema, newInviteSchema } from "../../../shared/schemas/club.ts";
import { entrySchema } from "../../../shared/schemas/entry.ts";
import { remindersSchema } from "../../../shared/schemas/reminders.ts";
import { syncRequestSchema } from "../../../shared/schemas/sync.ts";

/** What each route takes for a body; those that are not named take none. */
export const routeBodies: Record<string, z.ZodType> = {
  "POST /auth/sign-up": signUpSchema,
  "POST /auth/sign-in": signInSchema,
  "POST /auth/verify-email": tokenSchema,
  "POST /auth/request-password-reset": requestPasswordResetSchema,
  "POST /auth/reset-password": resetPasswordSchema,
  "DELETE /account": deleteAccountSchema,
  "POST /account/email": changeEmailSchema,
  "POST /account/password": changePasswordSchema,
  "PUT /account/reminders": remindersSchema,
  "POST /sync": syncRequestSchema.extend({ entries: z.array(entrySchema) }),
  "POST /clubs": newClubSchema,
  "PUT /clubs/:clubId/members/:userId": memberRolesSchema,
  "POST /clubs/:clubId/invites": newInviteSchema,
};
