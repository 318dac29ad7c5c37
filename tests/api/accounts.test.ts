import { addMinutes } from "date-fns";
import { afterEach, describe, expect, it, vi } from "vitest";
import { mailedToken } from "../helpers/mailed-token.ts";
import { cookieOf, createPhone, PASSWORD, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

const ann = { email: "Ann.Lee@club.example", password: PASSWORD, name: "Ann" };
const NEW_PASSWORD = "another pump altogether";

afterEach(() => {
  vi.useRealTimers();
});

async function askForReset(server: TestServer, email: string): Promise<string> {
  await createPhone(server).post("/api/auth/request-password-reset").send({ email }).expect(204);
  return mailedToken(server, "Choose a new password");
}

describe("signing up", () => {
  it("makes an account and signs it in", async () => {
    const phone = createPhone(await startTestServer());
    const response = await phone.post("/api/auth/sign-up").send(ann);
    expect(response.status).toBe(201);
    const { user } = response.body as { user: { id: string } };
    expect(user).toEqual({ id: user.id, email: ann.email, name: "Ann", verified: false });
    expect((await phone.get("/api/auth/me")).body).toEqual({ user });
  });

  it("says when an address is taken, in whatever case", async () => {
    const phone = createPhone(await startTestServer());
    await phone.post("/api/auth/sign-up").send(ann).expect(201);
    const again = { ...ann, email: ann.email.toUpperCase() };
    const response = await phone.post("/api/auth/sign-up").send(again);
    expect(response.status).toBe(409);
    expect(response.body).toMatchObject({ errors: { email: expect.any(String) as string } });
  });

  it("makes one account of two sign-ups at once", async () => {
    const server = await startTestServer();
    const answers = await Promise.all(
      [1, 2, 3].map(() => createPhone(server).post("/api/auth/sign-up").send(ann)),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
  });

  it.each([
    ["email", { ...ann, email: "nobody" }],
    ["password", { ...ann, password: "short" }],
    ["name", { ...ann, name: " " }],
    ["admin", { ...ann, admin: true }],
  ])("says what is wrong with %s", async (field, body) => {
    const phone = createPhone(await startTestServer());
    const response = await phone.post("/api/auth/sign-up").send(body);
    expect(response.status).toBe(422);
    expect(Object.keys((response.body as { errors: object }).errors)).toEqual([field]);
  });
});

describe("signing in", () => {
  it("answers a wrong password as it answers an unknown address", async () => {
    const server = await startTestServer();
    const phone = createPhone(server);
    await phone.post("/api/auth/sign-up").send(ann).expect(201);
    const wrong = [
      { email: ann.email, password: "not my password" },
      { email: "nobody@club.example", password: PASSWORD },
    ];
    const answers = await Promise.all(
      wrong.map((body) => createPhone(server).post("/api/auth/sign-in").send(body)),
    );
    for (const answer of answers) {
      expect(answer.status).toBe(401);
      expect(answer.body).toEqual(answers[0]!.body);
      expect(answer.headers["set-cookie"]).toBeUndefined();
    }
  });

  it("takes the address in any case", async () => {
    const server = await startTestServer();
    const { user } = await signUpRider(server);
    const again = await signInRider(server, user.email.toUpperCase());
    expect(again.user).toEqual(user);
  });

  it("ends the session that was there before", async () => {
    const server = await startTestServer();
    const { phone, user, cookie } = await signUpRider(server);
    const credentials = { email: user.email, password: PASSWORD };
    await phone.post("/api/auth/sign-in").send(credentials).expect(200);
    await phone.get("/api/auth/me").expect(200);
    await createPhone(server).get("/api/auth/me").set("Cookie", cookie).expect(401);
  });

  it("stays until one signs out, on this phone alone", async () => {
    const server = await startTestServer();
    const first = await signUpRider(server);
    const second = await signInRider(server, first.user.email);
    const response = await first.phone.post("/api/auth/sign-out");
    expect(response.status).toBe(204);
    expect(response.headers["set-cookie"]).toEqual([
      "session=; HttpOnly; Max-Age=0; Path=/; SameSite=Lax",
    ]);
    await first.phone.get("/api/auth/me").expect(401);
    await second.phone.get("/api/auth/me").expect(200);
    await first.phone.post("/api/auth/sign-out").expect(204);
  });

  it("keeps no cookie, token or password as it is", async () => {
    const server = await startTestServer();
    const response = await createPhone(server).post("/api/auth/sign-up").send(ann);
    const cookie = cookieOf(response).replace("session=", "");
    const reset = await askForReset(server, ann.email);
    const kept = JSON.stringify(
      ["users", "sessions", "mailed_tokens"].map((table) =>
        server.database.$client.prepare(`SELECT * FROM ${table}`).all(),
      ),
    );
    expect(kept).toContain(ann.email);
    for (const secret of [cookie, reset, PASSWORD]) expect(kept).not.toContain(secret);
  });
});

describe("a mailed link", () => {
  it("confirms an address, once", async () => {
    const server = await startTestServer();
    const { phone, user } = await signUpRider(server);
    const token = await mailedToken(server, "Confirm your e-mail address");
    const response = await phone.post("/api/auth/verify-email").send({ token });
    expect(response.status).toBe(200);
    expect(response.body).toEqual({ user: { ...user, verified: true } });
    expect((await phone.get("/api/auth/me")).body).toEqual({ user: { ...user, verified: true } });
    const again = await phone.post("/api/auth/verify-email").send({ token });
    expect(again.status).toBe(422);
    expect(again.body).toHaveProperty("errors.token");
  });

  it("sets a new password, once, and ends every session", async () => {
    const server = await startTestServer();
    const { phone, user } = await signUpRider(server);
    const token = await askForReset(server, user.email.toUpperCase());
    const body = { token, password: NEW_PASSWORD };
    await createPhone(server).post("/api/auth/reset-password").send(body).expect(204);
    await phone.get("/api/auth/me").expect(401);
    const old = { email: user.email, password: PASSWORD };
    await phone.post("/api/auth/sign-in").send(old).expect(401);
    await signInRider(server, user.email, NEW_PASSWORD);
    await phone.post("/api/auth/reset-password").send(body).expect(422);
  });

  it("to a new password is good for 30 minutes", async () => {
    const server = await startTestServer();
    const { phone, user } = await signUpRider(server);
    const token = await askForReset(server, user.email);
    vi.useFakeTimers({ toFake: ["Date"], now: addMinutes(new Date(), 31) });
    const body = { token, password: NEW_PASSWORD };
    await phone.post("/api/auth/reset-password").send(body).expect(422);
  });

  it("of one kind does not do for another", async () => {
    const server = await startTestServer();
    const { phone } = await signUpRider(server);
    const token = await mailedToken(server, "Confirm your e-mail address");
    const body = { token, password: NEW_PASSWORD };
    await phone.post("/api/auth/reset-password").send(body).expect(422);
    await phone.post("/api/auth/verify-email").send({ token }).expect(200);
  });

  it("is asked for with the same answer whether there is such an account or not", async () => {
    const server = await startTestServer();
    const { phone, user } = await signUpRider(server);
    const answers = await Promise.all(
      [user.email, "nobody@club.example"].map((email) =>
        phone.post("/api/auth/request-password-reset").send({ email }),
      ),
    );
    for (const { status, text } of answers) expect([status, text]).toEqual([204, ""]);
    await mailedToken(server, "Choose a new password");
    expect(server.mails().filter((mail) => mail.includes("nobody@"))).toEqual([]);
  });

  it("is mailed to one account at most five times before one is used", async () => {
    const server = await startTestServer();
    const { user } = await signUpRider(server);
    for (let n = 0; n < 7; n++) await askForReset(server, user.email);
    await server.mailer.sendDue();
    const resets = server.mails().filter((mail) => mail.includes("Choose a new password for"));
    expect(resets).toHaveLength(5);
  });
});
