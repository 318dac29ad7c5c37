/**
 * `/api/account/*`: one's own account, signed in.
 *
 * | call | answers |
 * |---|---|
 * | `POST /api/account/verification` | 204, and a mail with a link |
 * | `POST /api/account/email` `changeEmailSchema` | 204, and a mail to both addresses; it counts once the link in the new one's is followed |
 * | `POST /api/account/password` `changePasswordSchema` | 204, and a new cookie; every other device is signed out |
 * | `GET /api/account/devices` | `devicesResponseSchema` |
 * | `DELETE /api/account/devices` | 204: signs out every device but the one that asks |
 * | `DELETE /api/account/devices/:deviceId` | 204 |
 * | `DELETE /api/account` `deleteAccountSchema` | 204 |
 * | `GET /api/export`, `GET /api/export/checks.csv` | a file |
 */
import { z } from "zod";
import { emailSchema, knownPasswordSchema, newPasswordSchema } from "./auth.ts";

export const deleteAccountSchema = z.strictObject({ password: knownPasswordSchema });
export const changeEmailSchema = z.strictObject({
  email: emailSchema,
  password: knownPasswordSchema,
});
export const changePasswordSchema = z.strictObject({
  password: knownPasswordSchema,
  newPassword: newPasswordSchema,
});

export const deviceSchema = z.object({
  id: z.string(),
  /** The browser and its system, in words. */
  name: z.string(),
  signedInAt: z.string(),
  /** To the hour. */
  seenAt: z.string(),
  /** The one that asks. */
  current: z.boolean(),
});
export const devicesResponseSchema = z.object({ devices: z.array(deviceSchema) });

export type ChangeEmail = z.infer<typeof changeEmailSchema>;
export type ChangePassword = z.infer<typeof changePasswordSchema>;
export type Device = z.infer<typeof deviceSchema>;
