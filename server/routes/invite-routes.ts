import { Router } from "express";
import { newInviteSchema } from "../../shared/schemas/club.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

/** Links into a club: made and revoked by its organisers, followed by anyone who has one. */
export function createInviteRoutes({ services, sessions, limits }: ApiParts): Router {
  const { clubInvites } = services;
  const router = Router();
  const signedIn = requireSession(sessions);

  router
    .route("/clubs/:clubId/invites")
    .all(signedIn)
    .get((request, response) => {
      const invites = clubInvites.list(accountIdOf(response), request.params.clubId);
      response.json({ invites });
    })
    .post(limits.newInvites)
    .post(readJson, (request, response) => {
      const wanted = parseBody(newInviteSchema, request);
      const made = clubInvites.add(accountIdOf(response), request.params.clubId, wanted);
      response.status(201).json(made);
    });

  router
    .route("/clubs/:clubId/invites/:inviteId")
    .all(signedIn)
    .delete((request, response) => {
      const { clubId, inviteId } = request.params;
      clubInvites.revoke(accountIdOf(response), clubId, inviteId);
      response.status(204).end();
    });

  router
    .route("/invites/:token")
    .all(limits.inviteLinks)
    .get((request, response) => {
      response.json({ club: clubInvites.clubOf(request.params.token) });
    });

  router
    .route("/invites/:token/accept")
    .all(signedIn, limits.inviteLinks)
    .post((request, response) => {
      response.json({ club: clubInvites.accept(accountIdOf(response), request.params.token) });
    });

  return router;
}
