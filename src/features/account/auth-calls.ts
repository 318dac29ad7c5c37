/** The calls to `/api/auth`: what is sent is judged here first, in the words the server uses. */
import type { z } from "zod";
import {
  requestPasswordResetSchema,
  resetPasswordSchema,
  signInSchema,
  signUpSchema,
  tokenSchema,
  userResponseSchema,
  type SignIn,
  type SignUp,
  type User,
} from "../../../shared/schemas/auth.ts";
import { errorsByField } from "../../../shared/schemas/errors-by-field.ts";
import { apiRequest, rememberAccount, syncNow } from "../../offline/index.ts";
import { FieldErrors } from "../../ui/use-submit.ts";

function checked<T>(schema: z.ZodType<T>, typed: T): T {
  const parsed = schema.safeParse(typed);
  if (parsed.success) return parsed.data;
  throw new FieldErrors(errorsByField(parsed.error));
}

const post = (call: string, body?: unknown) =>
  apiRequest(`/api/auth/${call}`, { method: "POST", body });

/** From here on this phone is the rider's, with or without a network. */
async function enter(call: string, body: unknown): Promise<User> {
  const schema = userResponseSchema;
  const { user } = await apiRequest(`/api/auth/${call}`, { method: "POST", body, schema });
  rememberAccount(user);
  void syncNow();
  return user;
}

export const signUp = async (typed: SignUp) => enter("sign-up", checked(signUpSchema, typed));
export const signIn = async (typed: SignIn) => enter("sign-in", checked(signInSchema, typed));
export const signOut = () => post("sign-out");

export const requestPasswordReset = async (email: string) =>
  post("request-password-reset", checked(requestPasswordResetSchema, { email }));

export const resetPassword = async (token: string, password: string) =>
  post("reset-password", checked(resetPasswordSchema, { token, password }));

export const verifyEmail = async (token: string) =>
  post("verify-email", checked(tokenSchema, { token }));
