import { addHours } from "date-fns";
import { afterEach, describe, expect, it, vi } from "vitest";
import { mailedToken, newestMail } from "../helpers/mailed-token.ts";
import { cookieOf, createPhone, PASSWORD, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const NEW_PASSWORD = "another pump altogether";
const NEW_EMAIL = "Ann.Fell@club.example";
const CONFIRM_NEW = "Confirm your new e-mail address";

afterEach(() => {
  vi.useRealTimers();
});

async function askForChange() {
  const server = await startTestServer();
  const rider = await signUpRider(server);
  const body = { email: NEW_EMAIL, password: PASSWORD };
  await rider.phone.post("/api/account/email").send(body).expect(204);
  return { server, rider, token: await mailedToken(server, CONFIRM_NEW) };
}

describe("a change of address", () => {
  it("tells both addresses, and counts once the new one's link is followed", async () => {
    const { server, rider, token } = await askForChange();
    expect(await newestMail(server, CONFIRM_NEW)).toContain(`To: ${NEW_EMAIL}`);
    const warning = await newestMail(server, "Your e-mail address for Sumpless is about to change");
    expect(warning).toContain(`To: ${rider.user.email}`);
    expect(warning).not.toContain("token=");
    expect((await rider.phone.get("/api/auth/me")).body).toEqual({ user: rider.user });

    const response = await createPhone(server).post("/api/auth/verify-email").send({ token });
    const moved = { user: { ...rider.user, email: NEW_EMAIL, verified: true } };
    expect([response.status, response.body]).toEqual([200, moved]);
    expect((await rider.phone.get("/api/auth/me")).body).toEqual(moved);
    await signInRider(server, NEW_EMAIL.toLowerCase());
    const old = { email: rider.user.email, password: PASSWORD };
    await createPhone(server).post("/api/auth/sign-in").send(old).expect(401);
    const news = await newestMail(server, "Your e-mail address for Sumpless has changed");
    expect(news).toContain(`To: ${rider.user.email}`);
  });

  it("needs the password, and an address that is another one's own nowhere", async () => {
    const server = await startTestServer();
    const { phone, user } = await signUpRider(server);
    const other = await signUpRider(server, "Bob");
    const ask = async (email: string, password = PASSWORD) => {
      const response = await phone.post("/api/account/email").send({ email, password });
      return [response.status, Object.keys((response.body as { errors: object }).errors)];
    };
    expect(await ask(NEW_EMAIL, "not my password")).toEqual([422, ["password"]]);
    expect(await ask(other.user.email.toUpperCase())).toEqual([409, ["email"]]);
    expect(await ask(user.email)).toEqual([422, ["email"]]);
    expect(await ask("nobody")).toEqual([422, ["email"]]);
  });

  it("is good once, and for a day", async () => {
    const { rider, token } = await askForChange();
    vi.useFakeTimers({ toFake: ["Date"], now: addHours(new Date(), 25) });
    await rider.phone.post("/api/auth/verify-email").send({ token }).expect(422);
    vi.useRealTimers();
    await rider.phone.post("/api/auth/verify-email").send({ token }).expect(200);
    await rider.phone.post("/api/auth/verify-email").send({ token }).expect(422);
  });

  it("goes to whoever has the address first", async () => {
    const { server, rider, token } = await askForChange();
    const taken = { email: NEW_EMAIL.toLowerCase(), password: PASSWORD, name: "Bob" };
    await createPhone(server).post("/api/auth/sign-up").send(taken).expect(201);
    await rider.phone.post("/api/auth/verify-email").send({ token }).expect(409);
    expect((await rider.phone.get("/api/auth/me")).body).toEqual({ user: rider.user });
  });

  it("ends the links that were sent to the last address", async () => {
    const { server, rider, token } = await askForChange();
    const first = await mailedToken(server, "Confirm your e-mail address");
    const { email } = rider.user;
    await rider.phone.post("/api/auth/request-password-reset").send({ email }).expect(204);
    const reset = await mailedToken(server, "Choose a new password");
    await rider.phone.post("/api/auth/verify-email").send({ token }).expect(200);
    await rider.phone.post("/api/auth/verify-email").send({ token: first }).expect(422);
    const body = { token: reset, password: NEW_PASSWORD };
    await rider.phone.post("/api/auth/reset-password").send(body).expect(422);
  });

  it("that somebody else asked for ends with a change of the password", async () => {
    const { rider, token } = await askForChange();
    const body = { password: PASSWORD, newPassword: NEW_PASSWORD };
    await rider.phone.post("/api/account/password").send(body).expect(204);
    await rider.phone.post("/api/auth/verify-email").send({ token }).expect(422);
  });
});

describe("the mail that confirms an address", () => {
  it("can be asked for again, up to five times", async () => {
    const server = await startTestServer();
    const { phone } = await signUpRider(server);
    for (let n = 0; n < 4; n++) await phone.post("/api/account/verification").expect(204);
    const refused = await phone.post("/api/account/verification").expect(429);
    expect(Number(refused.headers["retry-after"])).toBeGreaterThan(0);
    const token = await mailedToken(server, "Confirm your e-mail address");
    await phone.post("/api/auth/verify-email").send({ token }).expect(200);
  });
});

describe("a change of password", () => {
  it("signs every other device out, and this one gets another cookie", async () => {
    const server = await startTestServer();
    const first = await signUpRider(server);
    const second = await signInRider(server, first.user.email);
    const body = { password: PASSWORD, newPassword: NEW_PASSWORD };
    const response = await first.phone.post("/api/account/password").send(body);
    expect(response.status).toBe(204);
    expect(cookieOf(response)).not.toBe(first.cookie);
    await first.phone.get("/api/auth/me").expect(200);
    await second.phone.get("/api/auth/me").expect(401);
    await createPhone(server).get("/api/auth/me").set("Cookie", first.cookie).expect(401);
    await signInRider(server, first.user.email, NEW_PASSWORD);
    const old = { email: first.user.email, password: PASSWORD };
    await createPhone(server).post("/api/auth/sign-in").send(old).expect(401);
    const news = await newestMail(server, "Your password for Sumpless has changed");
    expect(news).toContain(`To: ${first.user.email}`);
  });

  it("needs the last password, and a new one that is not easily guessed", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const ask = async (password: string, newPassword: string) => {
      const response = await phone.post("/api/account/password").send({ password, newPassword });
      return [response.status, Object.keys((response.body as { errors: object }).errors)];
    };
    expect(await ask("not my password", NEW_PASSWORD)).toEqual([422, ["password"]]);
    expect(await ask(PASSWORD, "password123")).toEqual([422, ["newPassword"]]);
    expect(await ask(PASSWORD, "short")).toEqual([422, ["newPassword"]]);
    await phone.get("/api/auth/me").expect(200);
  });
});
