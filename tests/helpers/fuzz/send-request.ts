import { request as httpRequest, type Agent, type IncomingMessage } from "node:http";
import { buffer } from "node:stream/consumers";
import { problemSchema } from "../../../shared/schemas/problem.ts";
import { CLIENT_FILES, type FuzzRequest } from "./arbitrary-request.ts";

/** Longer than any answer takes on a busy machine: beyond it, the server hangs. */
const PATIENCE_MS = 30_000;

/** Where requests go, and who sends them. */
export interface FuzzTarget {
  url: string;
  origin: string;
  cookie: string;
  /** Ids that are there, by the name that routes have for them. */
  ids: Record<string, string>;
  /** The address that the proxy in front says it was sent from. */
  from: string;
  agent: Agent;
}

function pathOf({ route, parts, query }: FuzzRequest, ids: Record<string, string>): string {
  let next = 0;
  const path = route.split(" ")[1]!.replace(/:(\w+)/g, (_, name: string) => {
    const part = parts[next++]!;
    return part.own ? (ids[name] ?? "none") : part.text;
  });
  const outside = route === CLIENT_FILES || path.startsWith("/dev/");
  return (outside ? path : `/api${path}`) + query;
}

function headersOf(request: FuzzRequest, target: FuzzTarget): Record<string, string> {
  const { cookie, origin, headers, body } = request;
  const own = { cookie: target.cookie, origin: target.origin };
  return {
    "x-forwarded-for": target.from,
    ...(cookie !== "none" && { cookie: cookie === "own" ? own.cookie : cookie }),
    ...(origin !== "none" && { origin: origin === "own" ? own.origin : origin }),
    ...headers,
    ...(body && { "content-length": String(body.length) }),
  };
}

function ask(request: FuzzRequest, target: FuzzTarget): Promise<IncomingMessage> {
  const method = request.route.split(" ")[0]!;
  const options = { method, headers: headersOf(request, target), agent: target.agent };
  return new Promise((resolve, reject) => {
    const sending = httpRequest(target.url + pathOf(request, target.ids), options, resolve);
    sending.setTimeout(PATIENCE_MS, () => sending.destroy(new Error("no answer")));
    sending.on("error", reject);
    sending.end(request.body ?? undefined);
  });
}

/** What is wrong with an answer; null where it is one that anybody may be given. */
export function wrongWith(status: number, type: string, text: string): string | null {
  if (status >= 500) return `${status}: ${text}`;
  if (status < 400) return null;
  if (/\bat .*\.[cm]?[jt]s:\d|node_modules|SqliteError/.test(text)) return `its inside: ${text}`;
  if (type !== "application/problem+json; charset=utf-8") return `${status} of type ${type}`;
  const problem = problemSchema.safeParse(JSON.parse(text));
  return problem.success && problem.data.status === status ? null : `no problem: ${text}`;
}

/** Sends it, and answers its status; throws where the answer, or that there is none, is wrong. */
export async function sendRequest(request: FuzzRequest, target: FuzzTarget): Promise<number> {
  const answer = await ask(request, target);
  const text = (await buffer(answer)).toString();
  const status = answer.statusCode ?? 0;
  // Node itself answers what is no HTTP request, before our code sees it.
  const ofNode = status === 400 && answer.headers["x-request-id"] === undefined;
  const wrong = ofNode ? null : wrongWith(status, answer.headers["content-type"] ?? "", text);
  if (wrong) throw new Error(wrong);
  return status;
}
