import supertest from "supertest";
import { describe, expect, it } from "vitest";
import type { createApp } from "../../server/app.ts";
import { clubOfFour } from "../helpers/club.ts";
import { listRoutes } from "../helpers/list-routes.ts";
import { bikeEntry, newId, noteEntry } from "../helpers/make-entry.ts";
import { cookieOf, createPhone, PASSWORD, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

type Method = "get" | "post" | "put" | "delete" | "options";

/** Each route's method and path, nothing in particular for its ids. */
const routesOf = (app: ReturnType<typeof createApp>["app"]) =>
  listRoutes(app).map((route) => {
    const [method, path] = route.split(" ") as [string, string];
    return { route, method: method.toLowerCase() as Method, path: path.replace(/:\w+/g, newId) };
  });

describe("session fixation", () => {
  it("gains nothing by a cookie of the attacker's making", async () => {
    const server = await startTestServer();
    const { user } = await signUpRider(server);
    const planted = "session=0123456789abcdefghijklmnopqrstuvwxyz0123";
    const response = await createPhone(server)
      .post("/api/auth/sign-in")
      .set("Cookie", planted)
      .send({ email: user.email, password: PASSWORD });
    expect(response.status).toBe(200);
    expect(cookieOf(response)).not.toBe(planted);
    await createPhone(server).get("/api/auth/me").set("Cookie", planted).expect(401);
  });

  it("gains nothing by a session of the attacker's own", async () => {
    const server = await startTestServer();
    const victim = await signUpRider(server);
    const attacker = await signUpRider(server, "Mallory");
    const response = await createPhone(server)
      .post("/api/auth/sign-in")
      .set("Cookie", attacker.cookie)
      .send({ email: victim.user.email, password: PASSWORD });
    expect(cookieOf(response)).not.toBe(attacker.cookie);
    await createPhone(server).get("/api/auth/me").set("Cookie", attacker.cookie).expect(401);
  });
});

describe("a page of another site", () => {
  it("can change nothing, by whatever route, in the name of who is signed in", async () => {
    const server = await startTestServer();
    const { cookie } = await signUpRider(server);
    // The one click of mail programs comes from anywhere, and carries no session.
    const changing = routesOf(server.app).filter(
      ({ method, route }) => method !== "get" && route !== "POST /unsubscribe",
    );
    const answers: Record<string, number> = {};
    for (const { route, method, path } of changing)
      for (const type of ["application/json", "text/plain", "application/x-www-form-urlencoded"]) {
        const asked = supertest(server.url)[method](`/api${path}`);
        const headers = { Cookie: cookie, Origin: "https://elsewhere.example" };
        answers[`${route} ${type}`] = (await asked.set(headers).type(type).send("{}")).status;
      }
    expect(changing.length).toBeGreaterThan(20);
    expect(new Set(Object.values(answers)), JSON.stringify(answers)).toEqual(new Set([403]));
  });

  it("is never told that it may read or send anything", async () => {
    const server = await startTestServer();
    const { cookie } = await signUpRider(server);
    for (const { method, path } of routesOf(server.app))
      for (const asking of [method, "options"] as const) {
        const asked = supertest(server.url)[asking](`/api${path}`);
        const { headers } = await asked.set({
          Cookie: cookie,
          Origin: "https://elsewhere.example",
          "Access-Control-Request-Method": "DELETE",
        });
        const allowing = Object.keys(headers as object).filter((name) =>
          /^access-control/.test(name),
        );
        expect(allowing).toEqual([]);
      }
  });
});

const SQL = `x'); DROP TABLE entries; --" OR 1=1 /* % _ \\ ;`;

describe("SQL in what is sent", () => {
  it("is text like any other", async () => {
    const server = await startTestServer();
    const phone = createPhone(server);
    const email = "o'brien--or_1@club.example";
    const signUp = { email, password: `${SQL} ${PASSWORD}`, name: SQL };
    await phone.post("/api/auth/sign-up").send(signUp).expect(201);
    const rider = await signInRider(server, email, signUp.password);
    expect(rider.user.name).toBe(SQL);

    const bikeId = newId();
    const { bikes } = await rider.sync([bikeEntry(bikeId, { name: SQL }), noteEntry(bikeId, SQL)]);
    expect(bikes[0]!.entries.map(({ body }) => body)).toEqual([{ name: SQL }, { text: SQL }]);
    expect((await rider.summary(bikeId)).name).toBe(SQL);
    const club = await rider.phone.post("/api/clubs").send({ name: SQL });
    expect(club.body).toMatchObject({ club: { name: SQL } });
  });

  it("finds nobody and nothing by an address, an id or a token", async () => {
    const server = await startTestServer();
    const { phone } = await signUpRider(server);
    const wild = ["%@club.example", "_%@club.example", "'OR'1'='1@club.example"];
    for (const email of wild) {
      const { status } = await phone.post("/api/auth/sign-in").send({ email, password: PASSWORD });
      expect([401, 422]).toContain(status);
    }
    const id = encodeURIComponent("' OR '1'='1");
    for (const path of ["bikes", "clubs", "invites"])
      await phone.get(`/api/${path}/${id}`).expect(404);
    await phone.delete(`/api/account/devices/${id}`).expect(404);
    await phone.post("/api/auth/verify-email").send({ token: "' OR '1'='1" }).expect(422);
    await phone.get("/api/auth/me").expect(200);
  });
});

describe("markup in what is sent", () => {
  it("comes back as it was sent, in answers that no browser takes for a page", async () => {
    const server = await startTestServer();
    const { organiser, club } = await clubOfFour(server);
    const name = `<img src=x onerror="alert(1)"></script>`;
    const bikeId = newId();
    await organiser.sync([bikeEntry(bikeId, { name })]);
    for (const path of [`/api/bikes/${bikeId}`, "/api/export", `/api/clubs/${club.id}/members`]) {
      const { headers, type } = await organiser.phone.get(path).expect(200);
      expect(type).toBe("application/json");
      expect(headers["x-content-type-options"]).toBe("nosniff");
      expect(headers["content-security-policy"]).toContain("sandbox");
    }
    expect((await organiser.summary(bikeId)).name).toBe(name);
    const missing = await organiser.phone.get(`/api/${encodeURIComponent(name)}`).expect(404);
    expect(missing.headers["content-type"]).toBe("application/problem+json; charset=utf-8");
    expect(missing.text).not.toContain("<img");
  });
});
