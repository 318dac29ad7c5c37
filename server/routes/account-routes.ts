import { Router } from "express";
import { changeEmailSchema, changePasswordSchema } from "../../shared/schemas/account.ts";
import { notFound } from "../problems.ts";
import type { ApiParts } from "./api.ts";
import { readJson } from "./guard-requests.ts";
import { logEvent } from "./log-event.ts";
import { parseBody } from "./parse-body.ts";
import { accountIdOf, requireSession, sessionIdOf } from "./require-session.ts";

/** What lets people into an account: its address, its password, its devices. */
export function createAccountRoutes({ services, sessions, limits }: ApiParts): Router {
  const { accounts } = services;
  const router = Router();
  const signedIn = requireSession(sessions);

  router.post("/account/verification", signedIn, (_request, response) => {
    accounts.sendVerificationAgain(accountIdOf(response));
    response.status(204).end();
  });

  router.post(
    "/account/email",
    signedIn,
    ...limits.password,
    readJson,
    async (request, response) => {
      const accountId = accountIdOf(response);
      await accounts.askForEmailChange(accountId, parseBody(changeEmailSchema, request));
      logEvent(request, "email-change-asked", accountId);
      response.status(204).end();
    },
  );

  router.post(
    "/account/password",
    signedIn,
    ...limits.password,
    readJson,
    async (request, response) => {
      const accountId = accountIdOf(response);
      const typed = parseBody(changePasswordSchema, request);
      const cookie = await accounts.changePassword(accountId, typed, request.headers);
      logEvent(request, "password-changed", accountId);
      response.append("Set-Cookie", cookie);
      response.status(204).end();
    },
  );

  router
    .route("/account/devices")
    .all(signedIn)
    .get((_request, response) => {
      const current = sessionIdOf(response);
      const devices = sessions.list(accountIdOf(response));
      response.json({
        devices: devices.map((device) => ({ ...device, current: device.id === current })),
      });
    })
    .delete((request, response) => {
      sessions.endOthers(accountIdOf(response), sessionIdOf(response));
      logEvent(request, "other-devices-ended", accountIdOf(response));
      response.status(204).end();
    });

  router
    .route("/account/devices/:deviceId")
    .all(signedIn)
    .delete((request, response) => {
      if (!sessions.endOne(accountIdOf(response), request.params.deviceId)) throw notFound();
      logEvent(request, "device-ended", accountIdOf(response));
      response.status(204).end();
    });

  return router;
}
