import { Router } from "express";
import { syncRequestSchema } from "../../shared/schemas/sync.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

export function createLogbookRoutes({ services, sessions, limits }: ApiParts): Router {
  const router = Router();
  const signedIn = requireSession(sessions);

  router.post("/sync", signedIn, limits.sync, readJson, (request, response) => {
    const pushed = parseBody(syncRequestSchema, request);
    response.json(services.sync(accountIdOf(response), pushed));
  });

  router.get("/bikes", signedIn, (_request, response) => {
    response.type("json").send(services.ownSummariesJson(accountIdOf(response)));
  });

  router
    .route("/bikes/:bikeId")
    .all(signedIn)
    .get((request, response) => {
      const { bikeId } = request.params;
      response.type("json").send(services.bikeSummaryJson(accountIdOf(response), bikeId));
    })
    .delete((request, response) => {
      services.eraseBike(accountIdOf(response), request.params.bikeId);
      response.status(204).end();
    });

  return router;
}
