/** The calls to `/api/auth`: what is sent is judged here first, in the words the server uses. */
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
import { apiRequest, rememberAccount, rememberedAccount, syncNow } from "../../offline/index.ts";
import { checked } from "./checked.ts";

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

/** Of the account that the link belongs to, which need not be this phone's. */
export async function verifyEmail(token: string): Promise<void> {
  const body = checked(tokenSchema, { token });
  const schema = userResponseSchema;
  const { user } = await apiRequest("/api/auth/verify-email", { method: "POST", body, schema });
  if (user.id === rememberedAccount()?.id) rememberAccount(user);
}

export const readMe = async (): Promise<User> =>
  (await apiRequest("/api/auth/me", { schema: userResponseSchema })).user;
