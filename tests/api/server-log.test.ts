import { expect, it } from "vitest";
import { keepLog } from "../helpers/keep-log.ts";
import { createPhone, PASSWORD, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

it("the server's log holds no secret, no token and no address of a person", async () => {
  const { log, text } = keepLog("trace");
  const server = await startTestServer({}, log);
  const { phone, user, cookie } = await signUpRider(server);
  await phone.get("/verify?token=a-token");
  await phone.post("/api/auth/sign-in").send({ email: user.email, password: "wrong" });
  server.database.$client.exec("DROP TABLE mailed_tokens; DROP TABLE sessions");
  await phone.post("/api/auth/sign-in").send({ email: user.email, password: PASSWORD });
  await phone.post("/api/auth/request-password-reset").send({ email: user.email });

  expect(text()).toContain('"path":"/verify"');
  expect(text()).toContain('"statusCode":500');
  const secrets = [user.email, PASSWORD, cookie.replace("session=", ""), "a-token"];
  for (const secret of secrets) expect(text()).not.toContain(secret);
});

it("a mail that cannot be sent is logged without its address, and stops nobody", async () => {
  const { log, text } = keepLog("info");
  // Nothing listens on the discard port.
  const server = await startTestServer({ smtpUrl: "smtp://127.0.0.1:9" }, log);
  const { user } = await signUpRider(server);
  await server.mailer.sendDue();
  expect(text()).toContain("mail not sent");
  expect(text()).not.toContain(user.email);
});

it("the server's log says what happened to which account, and what was refused", async () => {
  const { log, text } = keepLog("info");
  const server = await startTestServer({}, log);
  const { phone, user, cookie } = await signUpRider(server);
  const signIn = (password: string) =>
    createPhone(server).post("/api/auth/sign-in").send({ email: user.email, password });
  await signIn("not the password").expect(401);
  await signIn(PASSWORD).expect(200);
  await phone.delete("/api/account/devices").expect(204);
  const change = { password: PASSWORD, newPassword: "another pump altogether" };
  await phone.post("/api/account/password").send(change).expect(204);
  await phone.get("/api/export").expect(200);
  await createPhone({ ...server, origin: "null" })
    .post("/api/auth/sign-out")
    .expect(403);
  await phone.delete("/api/account").send({ password: change.newPassword }).expect(204);

  const lines = text()
    .trim()
    .split("\n")
    .map((line) => JSON.parse(line) as { event?: string; accountId?: string; problem?: string });
  expect(lines.flatMap(({ event, problem }) => event ?? problem ?? [])).toEqual([
    "signed-up",
    "urn:sumpless:problem:wrong-credentials",
    "signed-in",
    "other-devices-ended",
    "password-changed",
    "data-exported",
    "urn:sumpless:problem:foreign-origin",
    "account-erased",
  ]);
  const accounts = lines.filter(({ event }) => event).map(({ accountId }) => accountId);
  expect(new Set(accounts)).toEqual(new Set([user.id]));
  const secrets = [user.email, PASSWORD, change.newPassword, cookie.replace("session=", "")];
  for (const secret of secrets) expect(text()).not.toContain(secret);
});
