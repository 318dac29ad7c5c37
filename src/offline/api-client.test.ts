// @vitest-environment node
import { createServer, type RequestListener, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { afterEach, describe, expect, it } from "vitest";
import { z } from "zod";
import { apiRequest } from "./api-client.ts";
import { apiNewer } from "./api-newer.ts";
import { ApiError, NoNetworkError } from "./errors.ts";

const schema = z.object({ bikes: z.array(z.string()) });
let server: Server;

async function serve(listener: RequestListener): Promise<string> {
  server = createServer(listener);
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}

const answer =
  (status: number, headers: Record<string, string>, body = ""): RequestListener =>
  (_, response) =>
    response.writeHead(status, headers).end(body);

const problem = { type: "about:blank", title: "Busy", status: 503, detail: "Come back later." };
const asProblem = { "content-type": "application/problem+json; charset=utf-8" };
const asJson = { "content-type": "application/json; charset=utf-8" };
const ask = (url: string) => apiRequest(`${url}/api/bikes`, { schema });
const failureOf = (url: string) => ask(url).catch((error: unknown) => error);

describe("a request to the server", () => {
  afterEach(() => {
    server.closeAllConnections();
    server.close();
  });

  it("answers what the schema parsed", async () => {
    const url = await serve(answer(200, asJson, '{"bikes":["a"],"more":1}'));
    expect(await ask(url)).toEqual({ bikes: ["a"] });
  });

  it("sends its body as JSON", async () => {
    const url = await serve((request, response) => {
      const type = request.headers["content-type"];
      let text = "";
      request.on("data", (chunk) => (text += String(chunk)));
      request.on("end", () =>
        response
          .writeHead(200, asJson)
          .end(JSON.stringify({ bikes: [request.method, type, text] })),
      );
    });
    const { bikes } = await apiRequest(`${url}/`, { method: "POST", body: { a: 1 }, schema });
    expect(bikes).toEqual(["POST", "application/json", '{"a":1}']);
  });

  it("needs no body where none is expected", async () => {
    expect(await apiRequest(await serve(answer(204, {})))).toBeUndefined();
  });

  it("throws the server's problem, with how long to wait", async () => {
    const headers = { ...asProblem, "retry-after": "7" };
    const error = await failureOf(await serve(answer(503, headers, JSON.stringify(problem))));
    expect(error).toBeInstanceOf(ApiError);
    expect(error).toMatchObject({
      status: 503,
      message: "Come back later.",
      problem,
      retryAfterMs: 7_000,
    });
  });

  it("reads a Retry-After date by the server's own clock", async () => {
    const headers = {
      ...asProblem,
      date: "Thu, 01 Jan 1970 00:00:00 GMT",
      "retry-after": "Thu, 01 Jan 1970 00:01:00 GMT",
    };
    const url = await serve(answer(503, headers, JSON.stringify(problem)));
    expect(await failureOf(url)).toMatchObject({ retryAfterMs: 60_000 });
  });

  it.each<[string, RequestListener]>([
    ["a sign-in page", answer(200, { "content-type": "text/html" }, "<h1>Welcome</h1>")],
    ["a sign-in page that calls itself JSON", answer(200, asJson, "<h1>Welcome</h1>")],
    ["JSON of another shape", answer(200, asJson, '{"hello":"there"}')],
    ["a redirect", answer(302, { location: "/portal" })],
    ["a stranger's 401", answer(401, { "content-type": "text/html" }, "Sign in")],
    ["a 401 that is no problem document", answer(401, asJson, "{}")],
    [
      "a cut-off answer",
      (_, response) => {
        response.writeHead(200, asJson).write('{"bi');
        response.destroy();
      },
    ],
    ["a closed door", (request) => request.socket.destroy()],
  ])("takes %s for no network", async (_, listener) => {
    expect(await failureOf(await serve(listener))).toBeInstanceOf(NoNetworkError);
  });

  it("gives up on a server that does not answer", async () => {
    const url = await serve(() => undefined);
    await expect(apiRequest(url, { schema, timeoutMs: 20 })).rejects.toBeInstanceOf(NoNetworkError);
  });

  it("keeps the status and the wait of a proxy's own error page", async () => {
    const headers = { "content-type": "text/html", "retry-after": "9" };
    const error = await failureOf(await serve(answer(413, headers, "<h1>Too large</h1>")));
    expect(error).toMatchObject({ name: "NoNetworkError", status: 413, retryAfterMs: 9_000 });
  });
});

describe("asking for what is newer", () => {
  afterEach(() => {
    server.closeAllConnections();
    server.close();
  });

  const board: RequestListener = (request, response) =>
    request.headers["if-none-match"] === '"2"'
      ? response.writeHead(304).end()
      : response.writeHead(200, { ...asJson, etag: '"2"' }).end('{"bikes":["a"]}');

  it("answers it with its tag, and nothing where the tag's answer still holds", async () => {
    const url = await serve(board);
    const newer = { etag: '"2"', content: { bikes: ["a"] } };
    expect(await apiNewer(url, schema, null)).toEqual(newer);
    expect(await apiNewer(url, schema, '"1"')).toEqual(newer);
    expect(await apiNewer(url, schema, '"2"')).toBeNull();
  });

  it("takes a 304 that nobody asked for as no network", async () => {
    const url = await serve(answer(304, {}));
    await expect(apiNewer(url, schema, null)).rejects.toBeInstanceOf(NoNetworkError);
  });
});
