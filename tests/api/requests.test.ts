import { gzipSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import supertest from "supertest";
import { problemSchema } from "../../shared/schemas/problem.ts";
import { bikeEntry, newId, noteEntry } from "../helpers/make-entry.ts";
import { createPhone, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

interface Answer {
  status: number;
  type: string;
  body: unknown;
  text: string;
  headers: Record<string, string>;
}

function expectProblem(answer: Answer, status: number): void {
  expect(answer.status).toBe(status);
  expect(answer.type).toBe("application/problem+json");
  expect(problemSchema.parse(answer.body).status).toBe(status);
  expect(answer.text).not.toMatch(/\bat .*\.[jt]s:|node_modules|Error:/);
}

describe("a request that changes something", () => {
  it.each([
    ["none", undefined],
    ["another site's", "https://elsewhere.example"],
    ["another port's", "http://localhost:3001"],
    ["an opaque", "null"],
  ])("is refused with %s Origin", async (_which, origin) => {
    const server = await startTestServer();
    const { url } = server;
    const { cookie } = await signUpRider(server);
    const headers = { Cookie: cookie, ...(origin !== undefined && { Origin: origin }) };
    const sent = { known: {}, entries: [] };
    expectProblem(await supertest(url).post("/api/sync").set(headers).send(sent), 403);
    expectProblem(await supertest(url).post("/api/auth/sign-out").set(headers), 403);
    expectProblem(await supertest(url).delete(`/api/bikes/${newId()}`).set(headers), 403);
    await supertest(url).get("/api/auth/me").set(headers).expect(200);
  });

  it("is taken from the public origin, wherever the server itself listens", async () => {
    const server = await startTestServer({ publicOrigin: "https://logbook.example" });
    await createPhone(server).post("/api/auth/sign-out").expect(204);
    const elsewhere = createPhone({ url: server.url, origin: server.url });
    expectProblem(await elsewhere.post("/api/auth/sign-out"), 403);
  });

  it("is refused with a body of another type than JSON", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const json = '{"known":{},"entries":[]}';
    for (const type of ["text/plain", "application/x-www-form-urlencoded", "multipart/form-data"])
      expectProblem(await phone.post("/api/sync").type(type).send(json), 415);
    expectProblem(await phone.post("/api/sync").set("Content-Type", "").send(json), 415);
    const latin = "application/json; charset=latin1";
    expectProblem(await phone.post("/api/sync").type(latin).send(json), 415);
    await phone.post("/api/sync").type("application/json; charset=utf-8").send(json).expect(200);
  });

  it("is refused where its JSON is malformed", async () => {
    const { phone } = await signUpRider(await startTestServer());
    for (const text of ['{"known":', "nonsense", '"text"', "5"])
      expectProblem(await phone.post("/api/sync").type("json").send(text), 400);
  });

  it("is refused over 2 MB, and taken just below", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const entries = [bikeEntry(bikeId), ...Array.from({ length: 10 }, () => noteEntry(bikeId))];
    const padded = (bytes: number) => {
      const json = JSON.stringify({ known: {}, entries });
      return json + " ".repeat(bytes - json.length);
    };
    const limit = 2 * 1024 * 1024;
    expectProblem(
      await rider.phone
        .post("/api/sync")
        .type("json")
        .send(padded(limit + 1)),
      413,
    );
    expect((await rider.sync([])).bikes).toEqual([]);
    await rider.phone.post("/api/sync").type("json").send(padded(limit)).expect(200);
    expect((await rider.sync([])).bikes).toHaveLength(1);
  });

  it("is refused where it swells beyond 2 MB once unpacked", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const packed = gzipSync(Buffer.alloc(50 * 1024 * 1024, " "));
    const asked = phone.post("/api/sync").type("json").set("Content-Encoding", "gzip");
    expectProblem(
      await asked.serialize((body: Buffer) => body as unknown as string).send(packed),
      413,
    );
  });

  it("without a body says what is missing", async () => {
    const { phone } = await signUpRider(await startTestServer());
    for (const path of ["/api/sync", "/api/auth/sign-in"]) {
      const answer = await phone.post(path);
      expectProblem(answer, 422);
      expect(answer.body).toHaveProperty("errors");
    }
  });
});

describe("the API", () => {
  it("answers every unknown path with a problem", async () => {
    const { phone } = await signUpRider(await startTestServer());
    for (const path of ["/api", "/api/", "/api/nothing", "/api/auth/nothing", "/api/bikes/a/b"])
      expectProblem(await phone.get(path).set("Accept", "text/html"), 404);
    expectProblem(await phone.put("/api/sync").send({}), 404);
    expectProblem(await phone.get("/api/sync"), 404);
    expectProblem(await phone.get("/api/bikes/%E0"), 400);
  });

  it("says of what type and encoding each answer is", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const typeOf = async (path: string) => (await phone.get(path)).headers["content-type"];
    expect(await typeOf("/api/auth/me")).toBe("application/json; charset=utf-8");
    expect(await typeOf("/api/bikes")).toBe("application/json; charset=utf-8");
    expect(await typeOf("/api/export/checks.csv")).toBe("text/csv; charset=utf-8");
    expect(await typeOf("/api/nothing")).toBe("application/problem+json; charset=utf-8");
  });

  it("is kept by no cache", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const answers = [
      await phone.get("/api/health"),
      await phone.get("/api/bikes"),
      await phone.get("/api/nothing"),
      await phone.post("/api/sync").send({}),
    ];
    for (const { headers } of answers) expect(headers["cache-control"]).toBe("no-store");
  });

  it("tells a monitor that it is well", async () => {
    const { url } = await startTestServer();
    const answer = await supertest(url).get("/api/health");
    expect([answer.status, answer.body]).toEqual([200, { status: "ok" }]);
  });

  it("names each answer, so that it can be found in the log", async () => {
    const { url } = await startTestServer();
    const { headers } = await supertest(url).get("/api/health");
    expect(headers["x-request-id"]).toMatch(/^[\da-f-]{36}$/);
  });
});

describe("security headers", () => {
  const headersOf = async (publicOrigin: string) =>
    (await supertest((await startTestServer({ publicOrigin })).url).get("/")).headers as Record<
      string,
      string
    >;

  it("allow our own scripts only, and no frame around us", async () => {
    const headers = await headersOf("http://localhost:3000");
    const policy = headers["content-security-policy"]!.split(";");
    expect(policy).toContain("script-src 'self'");
    expect(policy).toContain("style-src 'self'");
    expect(policy).toContain("object-src 'none'");
    expect(policy).toContain("base-uri 'none'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(headers["x-content-type-options"]).toBe("nosniff");
    expect(headers["referrer-policy"]).toBe("no-referrer");
    expect(headers["permissions-policy"]).toContain("camera=(self), microphone=(self)");
    expect(headers["permissions-policy"]).toContain("geolocation=()");
    expect(headers).not.toHaveProperty("x-powered-by");
  });

  it("ask for https only where there is https", async () => {
    const plain = await headersOf("http://localhost:3000");
    expect(plain).not.toHaveProperty("strict-transport-security");
    expect(plain["content-security-policy"]).not.toContain("upgrade-insecure-requests");
    const secure = await headersOf("https://logbook.example");
    expect(secure["strict-transport-security"]).toBe("max-age=31536000; includeSubDomains");
    expect(secure["content-security-policy"]).toContain("upgrade-insecure-requests");
  });
});
