import * as argon2 from "@node-rs/argon2";
import { EventEmitter, once } from "node:events";
import { describe, expect, it, vi } from "vitest";
import { createPhone, PASSWORD, signInRider, signUpRider, type Phone } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

// The real library, its answers held back where a test says so.
vi.mock("@node-rs/argon2", { spy: true });
const real = await vi.importActual<typeof argon2>("@node-rs/argon2");

const NEW_PASSWORD = "another pump altogether";
const DEARER = { memoryCost: 128, timeCost: 1, parallelism: 1 };

/** The next call has its answer at `reached`, and gives it at `release`. */
function holdNext(name: "verify" | "hash") {
  const gate = new EventEmitter();
  const reached = once(gate, "reached");
  const call = real[name] as (...args: unknown[]) => Promise<never>;
  vi.mocked(argon2[name]).mockImplementationOnce(async (...args: unknown[]) => {
    const answer = await call(...args);
    const released = once(gate, "release");
    gate.emit("reached");
    await released;
    return answer;
  });
  return { reached, release: () => void gate.emit("release") };
}

async function changePassword({ phone }: { phone: Phone }): Promise<void> {
  const body = { password: PASSWORD, newPassword: NEW_PASSWORD };
  await phone.post("/api/account/password").send(body).expect(204);
}

const signIn = (server: TestServer, email: string, password = PASSWORD) =>
  createPhone(server).post("/api/auth/sign-in").send({ email, password });

/** The first server's data, its passwords kept at another cost from now on. */
async function atAnotherCost(server: TestServer) {
  await server.stop();
  return startTestServer({ dataDir: server.dataDir, hashCost: DEARER });
}

describe("a password that is changed while it is checked", () => {
  const change = { email: "thief@club.example", password: PASSWORD };
  const chosen = { password: PASSWORD, newPassword: "the pump of a thief" };

  it.each([
    [
      "begins no session",
      401,
      (phone: Phone, email: string) =>
        phone.post("/api/auth/sign-in").send({ email, password: PASSWORD }),
    ],
    ["moves no address", 422, (phone: Phone) => phone.post("/api/account/email").send(change)],
    ["chooses no other", 422, (phone: Phone) => phone.post("/api/account/password").send(chosen)],
    [
      "erases nothing",
      422,
      (phone: Phone) => phone.delete("/api/account").send({ password: PASSWORD }),
    ],
  ])("%s", async (_what, status, ask) => {
    const server = await startTestServer();
    const owner = await signUpRider(server);
    const thief = await signInRider(server, owner.user.email);
    const check = holdNext("verify");
    const asked = ask(thief.phone, owner.user.email).then((response) => response);
    await check.reached;
    await changePassword(owner);
    const { passwordHash } = server.store.users.find(owner.user.id)!;
    check.release();

    expect((await asked).status).toBe(status);
    expect(server.store.users.find(owner.user.id)?.passwordHash).toBe(passwordHash);
    const left = server.database.$client.prepare(
      `SELECT (SELECT count(*) FROM sessions) AS sessions,
        (SELECT count(*) FROM mailed_tokens WHERE purpose = 'change-email') AS moves`,
    );
    expect(left.get()).toEqual({ sessions: 1, moves: 0 });
    await owner.phone.get("/api/auth/me").expect(200);
  });

  it("is not put back by its hash being made anew", async () => {
    const first = await startTestServer();
    const { user, cookie } = await signUpRider(first);
    const server = await atAnotherCost(first);
    const owner = { phone: createPhone(server).set("Cookie", cookie) };
    const renewal = holdNext("hash");
    const asked = signIn(server, user.email).then((response) => response);
    await renewal.reached;
    await changePassword(owner);
    renewal.release();
    await asked;

    await signIn(server, user.email).expect(401);
    await owner.phone.get("/api/auth/me").expect(200);
    await signIn(server, user.email, NEW_PASSWORD).expect(200);
    expect(server.store.users.find(user.id)!.passwordHash).toContain("$m=128,t=1,p=1$");
  });
});

it("a password whose hash is made anew while it is checked is still taken", async () => {
  const first = await startTestServer();
  const { user } = await signUpRider(first);
  const server = await atAnotherCost(first);
  const check = holdNext("verify");
  const asked = signIn(server, user.email).then((response) => response);
  await check.reached;
  await signIn(server, user.email).expect(200);
  check.release();
  expect((await asked).status).toBe(200);
});
