import { mkdirSync, writeFileSync } from "node:fs";
import path from "node:path";
import { expect, it } from "vitest";
import supertest from "supertest";
import { startTestServer, temporaryDir } from "../helpers/start-test-server.ts";

const PAGE = "<!doctype html><title>Sumpless</title>";

/** A server over a built client of four files. */
async function client() {
  const clientDir = temporaryDir();
  mkdirSync(path.join(clientDir, "assets"));
  writeFileSync(path.join(clientDir, "index.html"), PAGE);
  writeFileSync(path.join(clientDir, "sw.js"), "self.skipWaiting();");
  writeFileSync(path.join(clientDir, "icon-192.png"), "png");
  writeFileSync(path.join(clientDir, "assets/index-a1b2c3.js"), "export {};".repeat(500));
  return supertest((await startTestServer({ clientDir })).url);
}

it("files named for their content are kept for good, and packed", async () => {
  const answer = await (await client()).get("/assets/index-a1b2c3.js");
  expect(answer.status).toBe(200);
  expect(answer.headers["cache-control"]).toBe("public, max-age=31536000, immutable");
  expect(answer.headers["content-encoding"]).toBe("gzip");
});

it("everything else is asked for anew", async () => {
  const site = await client();
  for (const file of ["/", "/index.html", "/sw.js", "/icon-192.png", "/bikes/new"]) {
    const answer = await site.get(file);
    expect(answer.status, file).toBe(200);
    expect(answer.headers["cache-control"], file).toBe("no-cache");
    expect(answer.headers.etag, file).toBeDefined();
  }
});

it("every page is index.html", async () => {
  const site = await client();
  for (const page of ["/", "/bikes/1/log/hours", "/sign-in?next=/", "/reset?token=a.b"]) {
    const answer = await site.get(page).set("Accept", "text/html,*/*;q=0.8");
    expect([answer.status, answer.type, answer.text]).toEqual([200, "text/html", PAGE]);
  }
});

it("a file that is not there is not a page", async () => {
  const site = await client();
  const missing = ["/assets/index-000000.js", "/assets/page", "/favicon.ico", "/api/nothing"];
  for (const file of missing) {
    const answer = await site.get(file).set("Accept", "text/html,*/*;q=0.8");
    expect([answer.status, answer.type]).toEqual([404, "application/problem+json"]);
  }
  const data = await site.get("/bikes").set("Accept", "application/json");
  expect(data.status).toBe(404);
  expect((await site.get("/../package.json")).status).toBe(404);
});

it("a part or a state of a file that there is not is no failure of the server's", async () => {
  const site = await client();
  const asked = { Range: "bytes=99999-", "If-Match": '"another"' };
  expect((await site.get("/sw.js").set("Range", asked.Range)).status).toBe(416);
  const changed = await site.get("/sw.js").set("If-Match", asked["If-Match"]);
  expect([changed.status, changed.type]).toEqual([412, "application/problem+json"]);
});

it("nothing but what was built is served, by whatever spelling of its path", async () => {
  const site = await client();
  const around = [
    "/.git/config",
    "/.env",
    "/package.json",
    "/data/sumpless.sqlite",
    "/server/index.ts",
  ];
  const up = [
    "/..%2fpackage.json",
    "/%2e%2e/%2e%2e/package.json",
    "/assets/..%5c..%5cpackage.json",
  ];
  for (const file of [...around, ...up]) {
    const answer = await site.get(file);
    if (answer.status === 200) expect(answer.text, file).toBe(PAGE);
    else expect([answer.status, answer.type], file).toEqual([404, "application/problem+json"]);
  }
});

it("without a built client every page is not found", async () => {
  const { url } = await startTestServer({ clientDir: path.join(temporaryDir(), "none") });
  expect((await supertest(url).get("/")).status).toBe(404);
});
