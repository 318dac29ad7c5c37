/** `/api/auth/*`: accounts. */
import { z } from "zod";

export const MIN_PASSWORD_LENGTH = 10;
export const MAX_PASSWORD_LENGTH = 128;

export const emailSchema = z
  .string("Type your e-mail address.")
  .max(254, "This address is too long.")
  .pipe(z.email("This does not look like an e-mail address."));

/** Length only: no composition rules. */
export const newPasswordSchema = z
  .string("Choose a password.")
  .min(MIN_PASSWORD_LENGTH, `At least ${MIN_PASSWORD_LENGTH} characters.`)
  .max(MAX_PASSWORD_LENGTH, `At most ${MAX_PASSWORD_LENGTH} characters.`);

export const signUpSchema = z.strictObject({
  email: emailSchema,
  password: newPasswordSchema,
  name: z
    .string("Say what others should call you.")
    .max(60, "At most 60 characters.")
    .regex(/\S/, "Say what others should call you."),
});

export const knownPasswordSchema = z
  .string("Type your password.")
  .min(1, "Type your password.")
  .max(1_000, "This is not a password of ours.");

export const signInSchema = z.strictObject({ email: emailSchema, password: knownPasswordSchema });

export const requestPasswordResetSchema = z.strictObject({ email: emailSchema });
export const tokenSchema = z.strictObject({ token: z.string().min(1).max(200) });
export const resetPasswordSchema = tokenSchema.extend({ password: newPasswordSchema });

export const userSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  verified: z.boolean(),
});
export const userResponseSchema = z.object({ user: userSchema });

export type SignUp = z.infer<typeof signUpSchema>;
export type SignIn = z.infer<typeof signInSchema>;
export type User = z.infer<typeof userSchema>;
