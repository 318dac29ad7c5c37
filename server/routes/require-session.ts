import type { RequestHandler, Response } from "express";
import type { Sessions } from "../auth/session.ts";
import { notSignedIn } from "../problems.ts";

/** Lets a signed-in account pass, and moves the end of its session. */
export const requireSession =
  (sessions: Sessions): RequestHandler =>
  async (request, response, next) => {
    const session = await sessions.read(request.headers.cookie);
    if (!session) throw notSignedIn();
    if (session.renewedCookie) response.append("Set-Cookie", session.renewedCookie);
    response.locals.accountId = session.userId;
    response.locals.sessionId = session.id;
    next();
  };

/** Of a response behind `requireSession`. */
export const accountIdOf = (response: Response) => response.locals.accountId as string;
export const sessionIdOf = (response: Response) => response.locals.sessionId as string;
