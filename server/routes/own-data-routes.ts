import { Router } from "express";
import { deleteAccountSchema } from "../../shared/schemas/account.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { logEvent } from "./log-event.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

export function createOwnDataRoutes({ services, sessions, limits }: ApiParts): Router {
  const router = Router();
  const signedIn = requireSession(sessions);

  router.get("/export", signedIn, limits.exports, (request, response) => {
    response.attachment("sumpless-export.json");
    response.json(services.exportAccount(accountIdOf(response)));
    logEvent(request, "data-exported", accountIdOf(response));
  });

  router.get("/export/checks.csv", signedIn, limits.exports, (request, response) => {
    response.attachment("sumpless-checks.csv");
    response.send(services.checksCsv(accountIdOf(response)));
    logEvent(request, "data-exported", accountIdOf(response));
  });

  router.delete("/account", signedIn, ...limits.password, readJson, async (request, response) => {
    const { password } = parseBody(deleteAccountSchema, request);
    await services.accounts.erase(accountIdOf(response), password);
    logEvent(request, "account-erased", accountIdOf(response));
    response.append("Set-Cookie", sessions.end(request.headers.cookie));
    response.status(204).end();
  });

  return router;
}
