import { Router, type Request, type Response } from "express";
import {
  requestPasswordResetSchema,
  resetPasswordSchema,
  signInSchema,
  signUpSchema,
  tokenSchema,
  type User,
} from "../../shared/schemas/auth.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

export function createAuthRoutes({ services: { accounts }, sessions, limits }: ApiParts): Router {
  const router = Router();

  /** Signing in never goes on with a session that was there before. */
  async function answerSignedIn(request: Request, response: Response, status: number, user: User) {
    await sessions.end(request.headers.cookie);
    response.append("Set-Cookie", await sessions.begin(user.id));
    response.status(status).json({ user });
  }

  router.post("/auth/sign-up", readJson, limits.signUp, async (request, response) => {
    const user = await accounts.signUp(parseBody(signUpSchema, request));
    await answerSignedIn(request, response, 201, user);
  });

  router.post("/auth/sign-in", readJson, ...limits.signIn, async (request, response) => {
    const user = await accounts.signIn(parseBody(signInSchema, request));
    await answerSignedIn(request, response, 200, user);
  });

  router.post("/auth/sign-out", async (request, response) => {
    response.append("Set-Cookie", await sessions.end(request.headers.cookie));
    response.status(204).end();
  });

  router.get("/auth/me", requireSession(sessions), (_request, response) => {
    response.json({ user: accounts.find(accountIdOf(response)) });
  });

  router.post("/auth/verify-email", readJson, limits.mailedLinks, (request, response) => {
    response.json({ user: accounts.verifyEmail(parseBody(tokenSchema, request).token) });
  });

  router.post("/auth/request-password-reset", readJson, limits.mailedLinks, (request, response) => {
    const { email } = parseBody(requestPasswordResetSchema, request);
    response.status(204).end();
    // Behind the answer, so that its time does not tell whether there is such an account.
    setImmediate(() => {
      try {
        accounts.requestPasswordReset(email);
      } catch (error) {
        request.log.error({ err: error }, "no link for a new password sent");
      }
    });
  });

  router.post("/auth/reset-password", readJson, limits.mailedLinks, async (request, response) => {
    const { token, password } = parseBody(resetPasswordSchema, request);
    await accounts.resetPassword(token, password);
    response.status(204).end();
  });

  return router;
}
