/** How often things may be tried: generous for people, slow for those who guess. */
import { minutesToMilliseconds } from "date-fns";
import type { Request, Response } from "express";
import { ipKeyGenerator, rateLimit } from "express-rate-limit";
import { tooMany } from "../problems.ts";
import { accountIdOf } from "./require-session.ts";

interface Limit {
  times: number;
  minutes: number;
  by: (request: Request, response: Response) => string;
  /** Tries that succeed do not count. */
  failuresOnly?: boolean;
}

const limited = ({ times, minutes, by, failuresOnly = false }: Limit) =>
  rateLimit({
    limit: times,
    windowMs: minutesToMilliseconds(minutes),
    keyGenerator: by,
    skipSuccessfulRequests: failuresOnly,
    standardHeaders: "draft-7",
    legacyHeaders: false,
    handler: (_request, _response, next) => next(tooMany()),
    // Its warnings are for other set-ups: how far proxies are trusted is a number of our config.
    validate: false,
  });

const address = (request: Request) => ipKeyGenerator(request.ip ?? "unknown");
const account = (_request: Request, response: Response) => accountIdOf(response);
const email = ({ body }: Request) =>
  String((body as { email?: unknown } | undefined)?.email)
    .slice(0, 254)
    .toLowerCase();
const emailFromAddress = (request: Request) => `${address(request)} ${email(request)}`;

/** Made anew for each app, with counters of its own. */
export const createRateLimits = () => ({
  signUp: limited({ times: 60, minutes: 60, by: address }),
  /** The address first: past it, a flood of made-up e-mails would be a flood of counters. */
  signIn: [
    limited({ times: 100, minutes: 15, by: address, failuresOnly: true }),
    limited({ times: 10, minutes: 15, by: emailFromAddress, failuresOnly: true }),
    limited({ times: 50, minutes: 15, by: email, failuresOnly: true }),
  ],
  /** Asking for a link, and following one. How many mails an account gets is limited where they are sent. */
  mailedLinks: limited({ times: 60, minutes: 60, by: address }),
  password: [
    limited({ times: 10, minutes: 15, by: account, failuresOnly: true }),
    limited({ times: 30, minutes: 60, by: account }),
  ],
  exports: limited({ times: 30, minutes: 60, by: account }),
  newClubs: limited({ times: 30, minutes: 60, by: account }),
  /** Each may send a mail to an address that somebody typed. */
  newInvites: limited({ times: 120, minutes: 60, by: account }),
  /** A whole club may follow a link from one address; no link can be guessed. */
  inviteLinks: limited({ times: 600, minutes: 60, by: address }),
  sync: limited({ times: 240, minutes: 1, by: account }),
});

export type RateLimits = ReturnType<typeof createRateLimits>;
