import { connect } from "node:net";
import fc from "fast-check";

const PATIENCE_MS = 30_000;

const noise = fc
  .uint8Array({ maxLength: 600 })
  .map((bytes) => Buffer.from(bytes).toString("latin1"));

const head = (line: string, headers: string[], body = "") =>
  [line, "Host: localhost", ...headers, "", body].join("\r\n");

/** What may come over the line where HTTP should: noise, and requests that are wrong in their frame. */
export const arbitraryBytes = fc.oneof(
  noise,
  noise.map((line) => head(`GET /api/${line} HTTP/1.1`, [])),
  noise.map((value) => head("GET /api/health HTTP/1.1", [`X-Noise: ${value}`])),
  noise.map((body) => head("POST /api/sync HTTP/1.1", ["Content-Length: 9999"], body)),
  noise.map((body) => head("POST /api/sync HTTP/1.1", ["Transfer-Encoding: chunked"], body)),
  noise.map((body) =>
    head(
      "POST /api/sync HTTP/1.1",
      ["Content-Length: 4", "Transfer-Encoding: chunked", "Content-Type: application/json"],
      body,
    ),
  ),
  fc.nat(40_000).map((size) => head("GET / HTTP/1.1", [`Cookie: session=${"x".repeat(size)}`])),
  fc.constantFrom(
    head("GET /api/health HTTP/9.9", []),
    head("TRACE /api/health HTTP/1.1", []),
    head("CONNECT localhost:1 HTTP/1.1", []),
    head("GET http://elsewhere.example/ HTTP/1.1", []),
    head("PRI * HTTP/2.0", [], "SM\r\n\r\n"),
  ),
);

/** Sends bytes and hangs up the sending half; resolves with what came back once the line is closed. */
export const sendBytes = (url: string, bytes: string): Promise<string> =>
  new Promise((resolve, reject) => {
    const { hostname, port } = new URL(url);
    const socket = connect(Number(port), hostname);
    let answer = "";
    socket.setTimeout(PATIENCE_MS, () => {
      socket.destroy();
      reject(new Error("The line was left open."));
    });
    socket.on("data", (chunk) => (answer += chunk.toString("latin1")));
    // A server may cut the line of whoever sends noise.
    socket.on("error", () => undefined);
    socket.on("close", () => resolve(answer));
    socket.end(Buffer.from(bytes, "latin1"));
  });
