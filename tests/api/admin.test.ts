import { spawnSync } from "node:child_process";
import { describe, expect, it } from "vitest";
import { administer } from "../../server/administer.ts";
import { createSessions } from "../../server/auth/session.ts";
import { createAdministration } from "../../server/services/administration.ts";
import { clubOfFour } from "../helpers/club.ts";
import { smallLog, newId } from "../helpers/make-entry.ts";
import { createPhone, PASSWORD, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer, temporaryDir, type TestServer } from "../helpers/start-test-server.ts";

/** Does what the operator types beside a running server. */
function operatorOf({ database, store, origin }: TestServer) {
  const sessions = createSessions(database, origin);
  const administration = createAdministration({ store, sessions, publicOrigin: origin });
  return (...args: string[]) => administer(administration, args);
}

describe("the operator", () => {
  it("can make a link by which a rider chooses a new password", async () => {
    const server = await startTestServer();
    const { user } = await signUpRider(server);
    const link = operatorOf(server)("reset-link", user.email.toUpperCase());
    expect(link).toMatch(/^http:\/\/localhost:3000\/reset#token=[\w-]{22}$/);
    const body = { token: link.split("token=")[1], password: "another pump altogether" };
    const phone = createPhone(server);
    await phone.post("/api/auth/reset-password").send(body).expect(204);
    await phone.post("/api/auth/reset-password").send(body).expect(422);
    await signInRider(server, user.email, body.password);
  });

  it("can sign a rider out everywhere, or everyone", async () => {
    const server = await startTestServer();
    const [ann, bob] = [await signUpRider(server), await signUpRider(server, "Bob")];
    await signInRider(server, ann.user.email);
    const admin = operatorOf(server);
    expect(admin("end-sessions", ann.user.email)).toBe("Sessions ended: 2");
    await ann.phone.get("/api/auth/me").expect(401);
    await bob.phone.get("/api/auth/me").expect(200);
    expect(admin("end-sessions", "--all")).toBe("Everyone is signed out.");
    await bob.phone.get("/api/auth/me").expect(401);
  });

  it("can erase an account, for good, once sure of it", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const log = smallLog(newId());
    await rider.sync(log);
    const admin = operatorOf(server);
    expect(() => admin("delete-account", rider.user.email)).toThrow("Nothing erased");
    await rider.phone.get("/api/auth/me").expect(200);
    admin("delete-account", rider.user.email, "--yes");
    const credentials = { email: rider.user.email, password: PASSWORD };
    await createPhone(server).post("/api/auth/sign-in").send(credentials).expect(401);
    const { results } = await (await signUpRider(server, "Bob")).sync(log);
    expect(new Set(results.map(({ reason }) => reason))).toEqual(new Set(["erased"]));
  });

  it("can list the clubs", async () => {
    const server = await startTestServer();
    const { organiser } = await clubOfFour(server);
    const clubs = operatorOf(server)("list-clubs");
    expect(clubs).toContain("Moor Riders · since ");
    expect(clubs).toContain(`· 4 members · ${organiser.user.email}`);
  });

  it("is told what there is to do, and what does not fit", async () => {
    const admin = operatorOf(await startTestServer());
    for (const args of [[], ["reset-link"], ["end-sessions"], ["reset-link", "a", "b"], ["sing"]])
      expect(() => admin(...args)).toThrow("reset-link <e-mail>");
    expect(() => admin("reset-link", "nobody@club.example")).toThrow("There is no account for");
    expect(() => admin("list-clubs", "--force")).toThrow("--force");
    expect(admin("list-clubs")).toBe("There are no clubs.");
  });

  it("runs it as a program of its own, and is shown a sentence where it cannot", () => {
    const program = ["--import", "tsx", "server/admin.ts", "list-clubs"];
    const env = { ...process.env, DATA_DIR: temporaryDir() };
    const { status, stderr } = spawnSync(process.execPath, program, { env, encoding: "utf8" });
    expect(status).toBe(1);
    expect(stderr).toMatch(/^There is no database in \S+\n$/);
  }, 30_000);
});
