import { Router } from "express";
import { tokenSchema } from "../../shared/schemas/auth.ts";
import { remindersSchema } from "../../shared/schemas/reminders.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { parseBody, parseShape } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

/** Which mails an account gets. */
export function createReminderRoutes({ services, sessions }: ApiParts): Router {
  const router = Router();
  router
    .route("/account/reminders")
    .all(requireSession(sessions))
    .get((_request, response) => {
      response.json({ reminders: services.reminders.of(accountIdOf(response)) });
    })
    .put(readJson, (request, response) => {
      const wanted = parseBody(remindersSchema, request);
      response.json({ reminders: services.reminders.set(accountIdOf(response), wanted) });
    });
  return router;
}

/**
 * The one click of RFC 8058: mail programs post it from anywhere, as a form, and without a session.
 * The token says who and what; the body says nothing more. Never by GET: links are looked at by
 * machines.
 */
export function createUnsubscribeRoutes({ services }: Pick<ApiParts, "services">): Router {
  const router = Router();
  router.post("/unsubscribe", (request, response) => {
    services.reminders.unsubscribe(parseShape(tokenSchema, request.query).token);
    response.status(204).end();
  });
  return router;
}
