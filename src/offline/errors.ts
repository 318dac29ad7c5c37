import type { Problem } from "../../shared/schemas/problem.ts";

/** The entry is not on this phone yet. Keep the form as it is and let the rider try again. */
export class NotSavedError extends Error {
  override name = "NotSavedError";
  readonly code = "not-saved";
  constructor(options?: ErrorOptions) {
    super("Not saved yet. What you typed is still here: please save once more.", options);
  }
}

/** The entry is not well-formed: `errors` has a sentence for each wrong field (`body.runs.0.endMl`). */
export class InvalidEntryError extends Error {
  override name = "InvalidEntryError";
  readonly code = "invalid-entry";
  readonly errors: Record<string, string>;
  constructor(errors: Record<string, string>) {
    super(Object.values(errors)[0] ?? "Something here does not fit.");
    this.errors = errors;
  }
}

/**
 * This phone's store cannot be opened. *newer*: another tab runs a newer version of the app, so
 * this one should be reloaded; *unavailable*: the browser gives no storage, as in some private
 * windows.
 */
export class StoreUnavailableError extends Error {
  override name = "StoreUnavailableError";
  readonly code: "store-newer" | "store-unavailable";
  constructor(code: "store-newer" | "store-unavailable", options?: ErrorOptions) {
    super(
      code === "store-newer"
        ? "A newer version of the app is open in another tab. Load this page again."
        : "This browser does not let the app store anything here. A private window may be why.",
      options,
    );
    this.code = code;
  }
}

/** The server answered with a problem. */
export class ApiError extends Error {
  override name = "ApiError";
  readonly code = "api-problem";
  readonly status: number;
  readonly problem: Problem;
  /** How long the server asked to be left alone, ms. */
  readonly retryAfterMs: number | null;
  constructor(problem: Problem, retryAfterMs: number | null = null) {
    super(problem.detail);
    this.status = problem.status;
    this.problem = problem;
    this.retryAfterMs = retryAfterMs;
  }
}

/** No answer that can be trusted to come from the server: no network, a time-out, a sign-in page. */
export class NoNetworkError extends Error {
  override name = "NoNetworkError";
  readonly code = "no-network";
  /** The status, where there was an answer of some kind. */
  readonly status: number | null;
  readonly retryAfterMs: number | null;
  constructor(answer?: { status: number; retryAfterMs: number | null }, options?: ErrorOptions) {
    super("No network just now.", options);
    this.status = answer?.status ?? null;
    this.retryAfterMs = answer?.retryAfterMs ?? null;
  }
}
