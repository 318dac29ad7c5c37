/** Every error that the API answers, with its sentence: the one place for these texts. */
import { STATUS_CODES } from "node:http";
import type { z } from "zod";
import { errorsByField } from "../shared/schemas/errors-by-field.ts";
import { ProblemError } from "./problem-error.ts";

interface More {
  errors?: Record<string, string>;
  retryAfterSeconds?: number;
}

function problem(status: number, code: string, detail: string, more: More = {}): ProblemError {
  const type = `urn:sumpless:problem:${code}`;
  const title = STATUS_CODES[status] ?? "Error";
  const errors = more.errors && { errors: more.errors };
  return new ProblemError({ type, title, status, detail, ...errors }, more.retryAfterSeconds);
}

export const notJson = () => problem(400, "not-json", "What was sent is not JSON.");
export const badRequest = (status = 400) =>
  problem(status, "bad-request", "This request cannot be read.");
export const notSignedIn = () => problem(401, "not-signed-in", "Please sign in first.");
export const wrongCredentials = () =>
  problem(401, "wrong-credentials", "This e-mail address and password do not go together.");
export const foreignOrigin = () =>
  problem(403, "foreign-origin", "This was not sent from the logbook's own address.");
export const notFound = () => problem(404, "not-found", "There is nothing here.");
export const emailTaken = () =>
  problem(409, "email-taken", "There is already an account with this e-mail address.", {
    errors: { email: "There is already an account with this e-mail address." },
  });
export const lastOrganiser = () =>
  problem(
    409,
    "last-organiser",
    "This club would be left without an organiser. Make another member organiser first, or close the club.",
  );
export const otherAccount = () =>
  problem(409, "other-account", "Another account is signed in. Nothing was stored.");
export const tooLarge = () =>
  problem(413, "too-large", "This is more than fits into one request: at most 2 MB.");
export const unsupportedType = () =>
  problem(415, "unsupported-type", "Only JSON (application/json, UTF-8) is understood here.");
export const wrongFields = (
  errors: Record<string, string>,
  detail = "Some of what was sent cannot be used.",
) => problem(422, "wrong-fields", detail, { errors });
export const wrongShape = (error: z.ZodError) => wrongFields(errorsByField(error));
const DEAD_LINK = "This link was used already or has run out. Ask for a new one.";
export const goneLink = () => problem(404, "dead-link", DEAD_LINK);
export const deadLink = () => wrongFields({ token: DEAD_LINK }, DEAD_LINK);
export const tooMany = (retryAfterSeconds?: number) =>
  problem(429, "too-many", "That was tried too often. Please wait a little.", {
    ...(retryAfterSeconds !== undefined && { retryAfterSeconds }),
  });
export const failure = () =>
  problem(500, "failure", "Something went wrong on the server. Please try again later.");
export const unavailable = (retryAfterSeconds: number) =>
  problem(503, "unavailable", "The server cannot store anything just now. Nothing was stored.", {
    retryAfterSeconds,
  });
