import { Router } from "express";
import { lineUpPageSchema } from "../../shared/schemas/club.ts";
import type { ApiParts } from "./api.ts";
import { parseShape } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

/** What owners share with clubs, and the Line-up that clubs' mechanics see of it. */
export function createSharingRoutes({ services, sessions }: ApiParts): Router {
  const { bikeShares } = services;
  const router = Router();
  const signedIn = requireSession(sessions);

  router
    .route("/bikes/:bikeId/shares")
    .all(signedIn)
    .get((request, response) => {
      response.json({ shares: bikeShares.list(accountIdOf(response), request.params.bikeId) });
    });

  router
    .route("/bikes/:bikeId/shares/:clubId")
    .all(signedIn)
    .put((request, response) => {
      const { bikeId, clubId } = request.params;
      bikeShares.share(accountIdOf(response), bikeId, clubId);
      response.status(204).end();
    })
    .delete((request, response) => {
      const { bikeId, clubId } = request.params;
      bikeShares.withdraw(accountIdOf(response), bikeId, clubId);
      response.status(204).end();
    });

  router
    .route("/clubs/:clubId/line-up")
    .all(signedIn)
    .get((request, response) => {
      const wanted = parseShape(lineUpPageSchema, request.query);
      const page = services.lineUp(accountIdOf(response), request.params.clubId, wanted);
      response.set("ETag", page.etag);
      // The phone keeps the board itself. Asking past all caches, it says no-cache too: to Express
      // nothing would then ever be fresh.
      if (request.get("If-None-Match")?.includes(page.etag)) response.status(304).end();
      else response.type("json").send(page.json());
    });

  return router;
}
