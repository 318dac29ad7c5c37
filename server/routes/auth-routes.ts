import { Router } from "express";
import {
  requestPasswordResetSchema,
  resetPasswordSchema,
  signInSchema,
  signUpSchema,
  tokenSchema,
} from "../../shared/schemas/auth.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { logEvent } from "./log-event.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

export function createAuthRoutes({ services: { accounts }, sessions, limits }: ApiParts): Router {
  const router = Router();

  router.post("/auth/sign-up", readJson, limits.signUp, async (request, response) => {
    const user = await accounts.signUp(parseBody(signUpSchema, request));
    logEvent(request, "signed-up", user.id);
    response.append("Set-Cookie", sessions.begin(user.id, request.headers));
    response.status(201).json({ user });
  });

  router.post("/auth/sign-in", readJson, ...limits.signIn, async (request, response) => {
    const credentials = parseBody(signInSchema, request);
    const { user, cookie } = await accounts.signIn(credentials, request.headers);
    logEvent(request, "signed-in", user.id);
    response.append("Set-Cookie", cookie);
    response.json({ user });
  });

  router.post("/auth/sign-out", (request, response) => {
    response.append("Set-Cookie", sessions.end(request.headers.cookie));
    logEvent(request, "signed-out");
    response.status(204).end();
  });

  router.get("/auth/me", requireSession(sessions), (_request, response) => {
    response.json({ user: accounts.find(accountIdOf(response)) });
  });

  router.post("/auth/verify-email", readJson, limits.mailedLinks, (request, response) => {
    const user = accounts.verifyEmail(parseBody(tokenSchema, request).token);
    logEvent(request, "email-confirmed", user.id);
    response.json({ user });
  });

  router.post("/auth/request-password-reset", readJson, limits.mailedLinks, (request, response) => {
    const { email } = parseBody(requestPasswordResetSchema, request);
    logEvent(request, "password-reset-asked");
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
    logEvent(request, "password-reset", await accounts.resetPassword(token, password));
    response.status(204).end();
  });

  return router;
}
