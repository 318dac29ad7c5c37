import * as argon2 from "@node-rs/argon2";
import { describe, expect, it, vi } from "vitest";
import { mailedToken } from "../helpers/mailed-token.ts";
import { createPhone, PASSWORD, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

// The real library, its calls counted.
vi.mock("@node-rs/argon2", { spy: true });

const signUp = (server: Parameters<typeof createPhone>[0], password: string) =>
  createPhone(server)
    .post("/api/auth/sign-up")
    .send({ email: "ann@club.example", password, name: "Ann" });

describe("a password", () => {
  it.each([
    ["of 10 characters", "k7#Vw2!pQz"],
    ["of 128 characters", "heather over ".repeat(10).slice(0, 128)],
    ["of spaces and signs of any script", "  мотор 🛠 \u0000 \t 油  "],
  ])("%s is taken to the letter", async (_which, password) => {
    const server = await startTestServer();
    await signUp(server, password).expect(201);
    await signInRider(server, "ann@club.example", password);
    for (const near of [password.trim(), password.slice(0, -1), password.toUpperCase()])
      if (near !== password)
        await createPhone(server)
          .post("/api/auth/sign-in")
          .send({ email: "ann@club.example", password: near })
          .expect(401);
  });

  it.each([
    ["too short", "k7#Vw2!pQ"],
    ["too long", "heather over the ridge ".repeat(6)],
    ["common", "qwertyuiop"],
    ["made of the rider's own address", "ann@club.example"],
  ])("that is %s is refused, and no account made", async (_why, password) => {
    const server = await startTestServer();
    const response = await signUp(server, password);
    expect(response.status).toBe(422);
    expect(Object.keys((response.body as { errors: object }).errors)).toEqual(["password"]);
    await signUp(server, PASSWORD).expect(201);
  });

  it("that is common is refused after a mailed link too, and leaves the link its use", async () => {
    const server = await startTestServer();
    const { phone, user } = await signUpRider(server);
    await phone.post("/api/auth/request-password-reset").send({ email: user.email }).expect(204);
    const token = await mailedToken(server, "Choose a new password");
    const reset = (password: string) =>
      phone.post("/api/auth/reset-password").send({ token, password });
    expect((await reset("password123")).body).toHaveProperty("errors.password");
    await reset("another pump altogether").expect(204);
  });

  it("kept at another cost is hashed anew when its rider signs in", async () => {
    const server = await startTestServer();
    const { user } = await signUpRider(server);
    const stored = () => server.store.users.find(user.id)!.passwordHash;
    const first = stored();
    await signInRider(server, user.email);
    expect(stored()).toBe(first);
    await server.stop();

    const hashCost = { memoryCost: 128, timeCost: 1, parallelism: 1 };
    const dearer = await startTestServer({ dataDir: server.dataDir, hashCost });
    await signInRider(dearer, user.email);
    const { passwordHash } = dearer.store.users.find(user.id)!;
    expect(passwordHash).toMatch(/^\$argon2id\$v=19\$m=128,t=1,p=1\$/);
    await signInRider(dearer, user.email);
  });

  it("costs the same work to check whether there is such an account or not", async () => {
    const server = await startTestServer();
    const { user } = await signUpRider(server);
    const workFor = async (email: string) => {
      vi.mocked(argon2.verify).mockClear();
      vi.mocked(argon2.hash).mockClear();
      const body = { email, password: "not my password" };
      await createPhone(server).post("/api/auth/sign-in").send(body).expect(401);
      expect(argon2.hash).not.toHaveBeenCalled();
      return vi
        .mocked(argon2.verify)
        .mock.calls.map(([stored]) => String(stored).split("$").slice(0, 4).join("$"));
    };
    const known = await workFor(user.email);
    expect(known).toEqual(["$argon2id$v=19$m=64,t=1,p=1"]);
    expect(await workFor("nobody@club.example")).toEqual(known);
  });
});
