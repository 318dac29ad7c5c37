import { addDays, addMinutes } from "date-fns";
import { afterEach, describe, expect, it, vi } from "vitest";
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import { invite, makeClub } from "../helpers/club.ts";
import { linkIn, startMailServer } from "../helpers/mail-server.ts";
import { PASSWORD, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

afterEach(() => {
  vi.useRealTimers();
});

const passMinutes = (minutes: number) =>
  vi.useFakeTimers({ toFake: ["Date"], now: addMinutes(new Date(), minutes) });

const rowsOf = (server: Awaited<ReturnType<typeof startTestServer>>) =>
  server.database.$client.prepare("SELECT topic, letter, attempts, sent_at FROM mails").all();

describe("a mail", () => {
  it("goes out by the mail server that is set up, its link in one piece", async () => {
    const { letters, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl, mailFrom: "Sumpless <log@club.example>" });
    const { user, phone } = await signUpRider(server, "Zoë <b>");
    await server.mailer.sendDue();
    const [letter] = letters;
    expect(letter!.to).toEqual([user.email]);
    expect(letter!.headers.from).toBe("Sumpless <log@club.example>");
    expect(letter!.headers).not.toHaveProperty("list-unsubscribe");
    expect(letter!.raw.match(/^http:\/\/localhost:3000\/verify#token=[\w-]{22}\r?$/m)).toBeTruthy();
    expect(letter!.raw).not.toContain("Zo");
    const token = new URLSearchParams(linkIn(letter!, mailedPages.verify).split("#")[1]).get(
      "token",
    );
    await phone.post("/api/auth/verify-email").send({ token }).expect(200);
  });

  it("is kept without its text once it is sent", async () => {
    const { smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    await signUpRider(server);
    await server.mailer.sendDue();
    expect(rowsOf(server)).toEqual([
      { topic: "verify-email", letter: null, attempts: 1, sent_at: expect.any(String) as string },
    ]);
  });

  it("that the mail server does not take is tried again, later and later, and sent once", async () => {
    const { letters, state, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    state.busy = true;
    await signUpRider(server);
    await server.mailer.sendDue();
    expect(rowsOf(server)).toMatchObject([{ attempts: 1, sent_at: null }]);
    await server.mailer.sendDue();
    expect(rowsOf(server)).toMatchObject([{ attempts: 1 }]);
    passMinutes(1);
    await server.mailer.sendDue();
    expect(rowsOf(server)).toMatchObject([{ attempts: 2 }]);
    passMinutes(1);
    await server.mailer.sendDue();
    expect(rowsOf(server)).toMatchObject([{ attempts: 2 }]);
    state.busy = false;
    passMinutes(1);
    await server.mailer.sendDue();
    passMinutes(60);
    await server.mailer.sendDue();
    expect(letters).toHaveLength(1);
  });

  it("is given up once it is of no use, its text forgotten", async () => {
    const { letters, state, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    state.busy = true;
    await signUpRider(server);
    await server.mailer.sendDue();
    vi.useFakeTimers({ toFake: ["Date"], now: addDays(new Date(), 8) });
    state.busy = false;
    await server.mailer.sendDue();
    expect(letters).toEqual([]);
    expect(rowsOf(server)).toMatchObject([{ letter: null, sent_at: null }]);
  });

  it("stands in the database from before it is sent: the next server sends it, once", async () => {
    const { letters, state, smtpUrl } = await startMailServer();
    state.busy = true;
    const first = await startTestServer({ smtpUrl });
    await signUpRider(first);
    await first.stop();
    state.busy = false;
    passMinutes(2);
    for (const start of ["second", "third"]) {
      const server = await startTestServer({ smtpUrl, dataDir: first.dataDir });
      await server.mailer.sendDue();
      await server.stop();
      expect(letters, start).toHaveLength(1);
    }
  });

  it("whose sending was cut off goes out again under the same id", async () => {
    const { letters, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    const { $client } = server.database;
    await signUpRider(server);
    const { letter } = $client.prepare("SELECT letter FROM mails").get() as { letter: string };
    await server.mailer.sendDue();
    // As a crash between the mail server's answer and our writing it down leaves the row.
    $client.prepare("UPDATE mails SET letter = ?, sent_at = NULL, next_attempt_at = 0").run(letter);
    await server.mailer.sendDue();
    const ids = letters.map(({ headers }) => headers["message-id"]);
    expect(ids).toEqual([ids[0], ids[0]]);
    expect(ids[0]).toMatch(/^<.+@localhost>$/);
  });

  it("not sent yet is forgotten with the account it goes to", async () => {
    const { letters, state, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    state.busy = true;
    const { phone } = await signUpRider(server);
    await server.mailer.sendDue();
    await phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    state.busy = false;
    passMinutes(5);
    await server.mailer.sendDue();
    expect(letters).toEqual([]);
    expect(rowsOf(server)).toEqual([]);
  });
});

describe("an invitation", () => {
  it("is mailed, and its link lets the person in", async () => {
    const { about, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    const organiser = await signUpRider(server, "Olga");
    server.store.users.markVerified(organiser.user.id);
    const club = await makeClub(organiser, "Moor & <Fen> Riders");
    await invite(organiser, club.id, { email: "friend@club.example" });
    await server.mailer.sendDue();
    const [letter] = about("You are asked to join Moor & <Fen> Riders");
    expect(letter!.to).toEqual(["friend@club.example"]);
    expect(letter!.html).toContain("Moor &amp; &lt;Fen&gt; Riders");
    const token = new URLSearchParams(linkIn(letter!, mailedPages.join).split("?")[1]).get("token");
    const friend = await signUpRider(server, "Finn");
    const joined = await friend.phone.post(`/api/invites/${token}/accept`).expect(200);
    expect(joined.body).toMatchObject({ club: { id: club.id } });
  });

  it("revoked before it was sent is not sent", async () => {
    const { about, state, smtpUrl } = await startMailServer();
    const server = await startTestServer({ smtpUrl });
    const organiser = await signUpRider(server, "Olga");
    server.store.users.markVerified(organiser.user.id);
    const club = await makeClub(organiser);
    state.busy = true;
    const made = await invite(organiser, club.id, { email: "friend@club.example" });
    await server.mailer.sendDue();
    await organiser.phone.delete(`/api/clubs/${club.id}/invites/${made.invite.id}`).expect(204);
    state.busy = false;
    passMinutes(5);
    await server.mailer.sendDue();
    expect(about("asked to join")).toEqual([]);
  });
});
