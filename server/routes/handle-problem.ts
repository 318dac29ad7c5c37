import type { ErrorRequestHandler } from "express";
import * as problems from "../problems.ts";
import { ProblemError } from "../problem-error.ts";

interface KnownError {
  /** Of SQLite, or of the operating system. */
  code?: unknown;
  /** Of Express, its body parser and what serves its files. */
  status?: unknown;
  type?: unknown;
}

function fromExpress({ status, type }: KnownError): ProblemError | null {
  if (typeof status !== "number" || status < 400 || status >= 500) return null;
  if (status === 413) return problems.tooLarge();
  if (status === 415) return problems.unsupportedType();
  if (type === "entity.parse.failed") return problems.notJson();
  return problems.badRequest(status);
}

function fromStorage({ code }: KnownError): ProblemError | null {
  if (typeof code !== "string") return null;
  if (code.startsWith("SQLITE_BUSY")) return problems.unavailable(5);
  return ["SQLITE_FULL", "ENOSPC", "EDQUOT"].includes(code) ? problems.unavailable(60) : null;
}

function toProblem(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  const known = (typeof error === "object" && error !== null ? error : {}) as KnownError;
  return fromExpress(known) ?? fromStorage(known) ?? problems.failure();
}

/** Registered last. Answers every error as problem details; nothing of its inside is shown. */
export const handleProblem: ErrorRequestHandler = (error, request, response, next) => {
  if (response.headersSent) return next(error);
  const { problem, retryAfterSeconds } = toProblem(error);
  if (problem.status >= 500) request.log.error({ err: error as unknown }, "request failed");
  else request.log.info({ problem: problem.type }, "refused");
  if (retryAfterSeconds !== undefined) response.set("Retry-After", String(retryAfterSeconds));
  response.status(problem.status).type("application/problem+json").send(JSON.stringify(problem));
};
