import { Router } from "express";
import { deleteAccountSchema } from "../../shared/schemas/auth.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

export function createOwnDataRoutes({ services, sessions, limits }: ApiParts): Router {
  const router = Router();
  const signedIn = requireSession(sessions);

  router.get("/export", signedIn, (_request, response) => {
    response.attachment("sumpless-export.json");
    response.json(services.exportAccount(accountIdOf(response)));
  });

  router.delete("/account", signedIn, limits.password, readJson, async (request, response) => {
    const { password } = parseBody(deleteAccountSchema, request);
    await services.accounts.erase(accountIdOf(response), password);
    response.append("Set-Cookie", await sessions.end(request.headers.cookie));
    response.status(204).end();
  });

  return router;
}
