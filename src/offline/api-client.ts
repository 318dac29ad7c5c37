/** Speaks to the server: a parsed answer, the server's own problem, or no network. Never a guess. */
import { ApiError, NoNetworkError } from "./errors.ts";

/** A zod schema, named by what is used of it: the first load holds no zod. */
export interface AnswerSchema<T> {
  safeParse(data: unknown): { success: true; data: T } | { success: false };
}

export interface ApiRequest<T> {
  method?: "GET" | "POST" | "PUT" | "DELETE";
  body?: unknown;
  /** Left out where the answer has no body. */
  schema?: AnswerSchema<T>;
  timeoutMs?: number;
  /** Of the answer that is here already: where it still holds, it is not sent again. */
  etag?: string | null;
  fetch?: typeof fetch;
}

const TIMEOUT_MS = 30_000;

/** A redirect is an error: the API never redirects, sign-in pages of strange networks do. */
const requestInit = (request: ApiRequest<unknown>): RequestInit => ({
  method: request.method ?? "GET",
  redirect: "error",
  cache: "no-store",
  signal: AbortSignal.timeout(request.timeoutMs ?? TIMEOUT_MS),
  headers: {
    accept: "application/json",
    ...(request.body === undefined ? {} : { "content-type": "application/json" }),
    ...(request.etag ? { "if-none-match": request.etag } : {}),
  },
  ...(request.body === undefined ? {} : { body: JSON.stringify(request.body) }),
});

/** A date is read by the server's own clock: the phone's may be anywhere. */
function retryAfterMs(headers: Headers): number | null {
  const value = headers.get("retry-after");
  if (value === null) return null;
  const ms = /^\d+$/.test(value)
    ? Number(value) * 1000
    : Date.parse(value) - Date.parse(headers.get("date") ?? "");
  return Number.isFinite(ms) ? Math.max(0, ms) : null;
}

async function json(response: Response): Promise<unknown> {
  const isJson = /^application\/(problem\+)?json\b/.test(
    response.headers.get("content-type") ?? "",
  );
  return isJson ? response.json().catch(() => undefined) : undefined;
}

async function failure(response: Response): Promise<ApiError | NoNetworkError> {
  const retryAfter = retryAfterMs(response.headers);
  const { problemSchema } = await import("../../shared/schemas/problem.ts");
  const problem = problemSchema.safeParse(await json(response));
  return problem.success && problem.data.status === response.status
    ? new ApiError(problem.data, retryAfter)
    : new NoNetworkError({ status: response.status, retryAfterMs: retryAfter });
}

export async function answerOf<T>(path: string, request: ApiRequest<T>): Promise<Response> {
  const send = request.fetch ?? fetch;
  const response = await send(path, requestInit(request)).catch((cause: unknown) => {
    throw new NoNetworkError(undefined, { cause });
  });
  const holds = response.status === 304 && Boolean(request.etag);
  if ((!response.ok && !holds) || response.redirected) throw await failure(response);
  return response;
}

export async function contentOf<T>(response: Response, schema: AnswerSchema<T>): Promise<T> {
  const parsed = schema.safeParse(await json(response));
  if (parsed.success) return parsed.data;
  throw new NoNetworkError({ status: response.status, retryAfterMs: null });
}

/** A file that the server makes: what it answers counts only if it is of that type. */
export async function apiFile(path: string, type: string): Promise<Blob> {
  const response = await answerOf(path, {});
  if (response.headers.get("content-type")?.startsWith(type)) return response.blob();
  throw new NoNetworkError({ status: response.status, retryAfterMs: null });
}

/**
 * Calls the server. An answer counts only if it is 2xx, JSON, not redirected and of the schema's
 * shape; a problem document throws `ApiError`, everything else `NoNetworkError`.
 */
export async function apiRequest<T = void>(path: string, request: ApiRequest<T> = {}): Promise<T> {
  const response = await answerOf(path, request);
  return request.schema ? contentOf(response, request.schema) : (undefined as T);
}
