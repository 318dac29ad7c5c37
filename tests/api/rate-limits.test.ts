import { describe, expect, it } from "vitest";
import { newId } from "../helpers/make-entry.ts";
import { createPhone, PASSWORD, signInRider, signUpRider, type Phone } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const signUp = (phone: Phone) =>
  phone
    .post("/api/auth/sign-up")
    .send({ email: `${newId()}@club.example`, password: PASSWORD, name: "Ann" });

const signIn = (phone: Phone, email: string, password = "not the password") =>
  phone.post("/api/auth/sign-in").send({ email, password });

async function statuses(times: number, ask: () => PromiseLike<{ status: number }>) {
  const all: number[] = [];
  for (let n = 0; n < times; n++) all.push((await ask()).status);
  return all;
}

const repeated = (times: number, status: number) => Array.from({ length: times }, () => status);

describe("rate limits", { timeout: 30_000 }, () => {
  it("let 60 people sign up from one address in an hour", async () => {
    const phone = createPhone(await startTestServer());
    expect(await statuses(60, () => signUp(phone))).toEqual(repeated(60, 201));
    const refused = await signUp(phone);
    expect(refused.status).toBe(429);
    expect(refused.type).toBe("application/problem+json");
    expect(Number(refused.headers["retry-after"])).toBeGreaterThan(0);
  });

  it("let one address guess ten times at one account, and leave others alone", async () => {
    const server = await startTestServer();
    const { user, phone } = await signUpRider(server);
    const other = await signUpRider(server, "Bob");
    expect(await statuses(10, () => signIn(phone, user.email))).toEqual(repeated(10, 401));
    await signIn(phone, user.email.toUpperCase(), PASSWORD).expect(429);
    await signInRider(server, other.user.email);
  });

  it("do not count sign-ins that succeed", async () => {
    const server = await startTestServer();
    const { user, phone } = await signUpRider(server);
    const ask = () => signIn(phone, user.email, PASSWORD);
    expect(await statuses(15, ask)).toEqual(repeated(15, 200));
  });

  it("let many addresses together guess fifty times at one account", async () => {
    const server = await startTestServer({ trustedProxies: 1 });
    const { user, phone } = await signUpRider(server);
    let from = 0;
    const ask = () => signIn(phone, user.email).set("X-Forwarded-For", `192.0.2.${++from}`);
    expect(await statuses(50, ask)).toEqual(repeated(50, 401));
    await ask().expect(429);
  });

  it("do not believe what a caller says of its address unless a proxy is trusted", async () => {
    const server = await startTestServer();
    const { user, phone } = await signUpRider(server);
    let from = 0;
    const ask = () => signIn(phone, user.email).set("X-Forwarded-For", `192.0.2.${++from}`);
    await statuses(10, ask);
    await ask().expect(429);
  });

  it("let a signed-in phone guess ten times at its own account's password", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const tries = [
      () => phone.delete("/api/account").send({ password: "not the password" }),
      () =>
        phone
          .post("/api/account/email")
          .send({ email: "new@club.example", password: "not the password" }),
      () =>
        phone
          .post("/api/account/password")
          .send({ password: "not the password", newPassword: "another pump altogether" }),
    ];
    let next = 0;
    const ask = () => tries[next++ % tries.length]!();
    expect(await statuses(10, ask)).toEqual(repeated(10, 422));
    expect(await statuses(3, ask)).toEqual(repeated(3, 429));
  });

  it("let an account sync 240 times a minute, whatever others do", async () => {
    const server = await startTestServer();
    const [{ phone }, other] = [await signUpRider(server), await signUpRider(server, "Bob")];
    const ask = (who: Phone) => who.post("/api/sync").send({ known: {}, entries: [] });
    expect(await statuses(240, () => ask(phone))).toEqual(repeated(240, 200));
    const refused = await ask(phone);
    expect(refused.status).toBe(429);
    expect(Number(refused.headers["retry-after"])).toBeGreaterThan(0);
    await ask(other.phone).expect(200);
  });
});
