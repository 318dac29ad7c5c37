import { expect, it } from "vitest";
import { keepLog } from "../helpers/keep-log.ts";
import { PASSWORD, signUpRider } from "../helpers/rider.ts";
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
