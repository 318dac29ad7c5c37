import { describe, expect, it } from "vitest";
import supertest from "supertest";
import type { Config } from "../../server/config.ts";
import { readConfig } from "../../server/config.ts";
import { signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

async function serverWithMail(overrides: Partial<Config> = {}) {
  const server = await startTestServer(overrides);
  const { user } = await signUpRider(server);
  await server.mailer.sendDue();
  const open = (path: string, host = "localhost:3000") =>
    supertest(server.url).get(path).set("Host", host);
  return { server, user, open };
}

describe("the page of mail that was not sent", () => {
  it("lists the letters, and shows each as it would look", async () => {
    const { user, open } = await serverWithMail();
    const list = await open("/dev/mail").expect(200);
    expect(list.text).toContain(user.email);
    const path = /href="(\/dev\/mail\/[\w-]+)"/.exec(list.text)![1]!;
    const letter = await open(path).expect(200);
    expect(letter.type).toBe("text/html");
    expect(letter.text).toContain("Confirm this address");
    await open("/dev/mail/another").expect(404);
  });

  it("is shown to no other machine, whatever name it calls the server by", async () => {
    const { open } = await serverWithMail();
    for (const host of ["127.0.0.1:3000", "rebound.example", "rebound.example:3000"])
      await open("/dev/mail", host).expect(404);
  });

  it("is not there with a mail server, nor on a server that is reached from elsewhere", () => {
    const shows = (env: Record<string, string>) => readConfig(env).showMail;
    expect(shows({})).toBe(true);
    expect(shows({ PUBLIC_ORIGIN: "http://localhost:4100" })).toBe(true);
    expect(shows({ SMTP_URL: "smtp://mail.example:587" })).toBe(false);
    expect(shows({ PUBLIC_ORIGIN: "https://localhost" })).toBe(false);
    expect(shows({ PUBLIC_ORIGIN: "http://localhost.club.example" })).toBe(false);
    expect(shows({ PUBLIC_ORIGIN: "https://logbook.example" })).toBe(false);
  });

  it("is not served where it is not to be shown", async () => {
    const { open } = await serverWithMail({ showMail: false });
    await open("/dev/mail").set("Accept", "application/json").expect(404);
  });
});
