import type { Problem } from "../shared/schemas/problem.ts";

/** Thrown anywhere below a route; the error handler answers it as RFC 9457 problem details. */
export class ProblemError extends Error {
  override name = "ProblemError";
  readonly problem: Problem;
  readonly retryAfterSeconds: number | undefined;

  constructor(problem: Problem, retryAfterSeconds?: number) {
    super(problem.detail);
    this.problem = problem;
    this.retryAfterSeconds = retryAfterSeconds;
  }
}
