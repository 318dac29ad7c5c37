import { Router } from "express";
import type { Sessions } from "../auth/session.ts";
import { notFound } from "../problems.ts";
import type { Services } from "../services/services.ts";
import { createAccountRoutes } from "./account-routes.ts";
import { createAuthRoutes } from "./auth-routes.ts";
import { createClubRoutes } from "./club-routes.ts";
import { guardAnswers, requireJson, requireOwnOrigin } from "./guard-requests.ts";
import { createInviteRoutes } from "./invite-routes.ts";
import { createLogbookRoutes } from "./logbook-routes.ts";
import { createOwnDataRoutes } from "./own-data-routes.ts";
import type { RateLimits } from "./rate-limits.ts";
import { createReminderRoutes, createUnsubscribeRoutes } from "./reminder-routes.ts";
import { createSharingRoutes } from "./sharing-routes.ts";

export interface ApiParts {
  services: Services;
  sessions: Sessions;
  limits: RateLimits;
  publicOrigin: string;
}

export function createApi(parts: ApiParts): Router {
  const router = Router();
  router.use(guardAnswers, createUnsubscribeRoutes(parts));
  router.use(requireOwnOrigin(parts.publicOrigin), requireJson);
  router.get("/health", (_request, response) => {
    parts.services.assertHealthy();
    response.json({ status: "ok" });
  });
  router.use(createAuthRoutes(parts));
  router.use(createLogbookRoutes(parts));
  router.use(createOwnDataRoutes(parts));
  router.use(createAccountRoutes(parts));
  router.use(createReminderRoutes(parts));
  router.use(createClubRoutes(parts));
  router.use(createInviteRoutes(parts));
  router.use(createSharingRoutes(parts));
  router.use(() => {
    throw notFound();
  });
  return router;
}
