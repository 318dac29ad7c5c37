import { once } from "node:events";
import type { AddressInfo } from "node:net";
import { text } from "node:stream/consumers";
import { SMTPServer } from "smtp-server";
import { expect, it, onTestFinished } from "vitest";
import { signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

interface Letter {
  to: string[];
  text: string;
}

/** A real mail server on loopback, and what it is sent. */
async function startMailServer() {
  const letters: Letter[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS"],
    onData(stream, { envelope }, done) {
      void text(stream).then((letter) => {
        letters.push({ to: envelope.rcptTo.map(({ address }) => address), text: letter });
        done();
      });
    },
  });
  server.listen(0, "127.0.0.1");
  await once(server.server, "listening");
  onTestFinished(() => new Promise<void>((resolve) => server.close(() => resolve())));
  const { port } = server.server.address() as AddressInfo;
  return { letters, smtpUrl: `smtp://127.0.0.1:${port}` };
}

it("a mail goes out by the mail server that is set up, its link in one piece", async () => {
  const { letters, smtpUrl } = await startMailServer();
  const server = await startTestServer({ smtpUrl, mailFrom: "Sumpless <log@club.example>" });
  const { user } = await signUpRider(server, "Zoë <b>");
  await server.mailer.sendDue();
  const [letter] = letters;
  expect(letter!.to).toEqual([user.email]);
  expect(letter!.text).toContain("From: Sumpless <log@club.example>");
  expect(letter!.text.match(/^http:\/\/localhost:3000\/verify\?token=[\w-]{22}\r?$/m)).toBeTruthy();
  expect(letter!.text).toContain("text/html");
  expect(letter!.text).not.toContain("Zo");
});
