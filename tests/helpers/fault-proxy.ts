import { once } from "node:events";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import { setTimeout as sleep } from "node:timers/promises";
import { onTestFinished } from "vitest";

export const faults = [
  "none",
  "drop-request",
  "drop-answer",
  "cut-answer",
  "double",
  "delay",
  "portal",
  "redirect-to-portal",
  "unavailable",
] as const;
export type Fault = (typeof faults)[number];

const PORTAL = "<!doctype html><title>Welcome</title><p>Accept the terms to go on.</p>";

async function readAll(request: IncomingMessage): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}

async function forward(target: string, request: IncomingMessage, body: Buffer) {
  const { host: _host, connection: _connection, ...headers } = request.headers;
  const answer = await fetch(target + request.url, {
    method: request.method!,
    headers: headers as Record<string, string>,
    ...(body.length > 0 && { body: new Uint8Array(body) }),
  });
  return { answer, text: await answer.text() };
}

/** What lies between a phone and a server: for each exchange, `next` says what goes wrong. */
export async function startFaultProxy(target: () => string, next: () => Fault) {
  let exchanges = 0;

  async function exchange(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const fault = next();
    exchanges += 1;
    const body = await readAll(request);
    const hangUp = () => void request.socket.destroy();
    if (fault === "drop-request") return hangUp();
    if (fault === "portal") {
      response.writeHead(200, { "content-type": "text/html" }).end(PORTAL);
      return;
    }
    if (fault === "redirect-to-portal") {
      response.writeHead(302, { location: "/portal" }).end();
      return;
    }
    if (fault === "unavailable") {
      response.writeHead(503, { "content-type": "text/plain" }).end("Try later");
      return;
    }
    if (fault === "double") await forward(target(), request, body);
    if (fault === "delay") await sleep(20);
    const { answer, text } = await forward(target(), request, body);
    if (fault === "drop-answer") return hangUp();
    for (const name of ["content-type", "retry-after"])
      if (answer.headers.has(name)) response.setHeader(name, answer.headers.get(name)!);
    response.writeHead(answer.status, { "content-length": Buffer.byteLength(text) });
    if (fault !== "cut-answer") response.end(text);
    else response.write(text.slice(0, text.length / 2), hangUp);
  }

  const proxy = createServer((request, response) => void exchange(request, response));
  proxy.listen(0, "127.0.0.1");
  await once(proxy, "listening");
  onTestFinished(() => {
    proxy.close();
    proxy.closeAllConnections();
  });
  const url = `http://127.0.0.1:${(proxy.address() as AddressInfo).port}`;
  return { url, exchanges: () => exchanges };
}
