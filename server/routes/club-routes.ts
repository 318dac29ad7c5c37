import { Router } from "express";
import { memberRolesSchema, newClubSchema } from "../../shared/schemas/club.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession } from "./require-session.ts";

/** Clubs and who is in them. */
export function createClubRoutes({ services, sessions, limits }: ApiParts): Router {
  const { clubs, clubMembers } = services;
  const router = Router();
  const signedIn = requireSession(sessions);

  router
    .route("/clubs")
    .all(signedIn)
    .get((_request, response) => {
      response.json({ clubs: clubs.ofAccount(accountIdOf(response)) });
    })
    .post(limits.newClubs)
    .post(readJson, (request, response) => {
      const { name } = parseBody(newClubSchema, request);
      response.status(201).json({ club: clubs.add(accountIdOf(response), name) });
    });

  router
    .route("/clubs/:clubId")
    .all(signedIn)
    .get((request, response) => {
      response.json({ club: clubs.find(accountIdOf(response), request.params.clubId) });
    })
    .delete((request, response) => {
      clubs.close(accountIdOf(response), request.params.clubId);
      response.status(204).end();
    });

  router
    .route("/clubs/:clubId/members")
    .all(signedIn)
    .get((request, response) => {
      const members = clubMembers.list(accountIdOf(response), request.params.clubId);
      response.json({ members });
    });

  router
    .route("/clubs/:clubId/members/:userId")
    .all(signedIn)
    .put(readJson, (request, response) => {
      const { clubId, userId } = request.params;
      const roles = parseBody(memberRolesSchema, request);
      const member = clubMembers.setRoles(accountIdOf(response), clubId, userId, roles);
      response.json({ member });
    })
    .delete((request, response) => {
      const { clubId, userId } = request.params;
      clubMembers.remove(accountIdOf(response), clubId, userId);
      response.status(204).end();
    });

  return router;
}
