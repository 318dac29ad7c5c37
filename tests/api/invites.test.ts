import { addDays } from "date-fns";
import { afterEach, describe, expect, it, vi } from "vitest";
import { invitesResponseSchema } from "../../shared/schemas/club.ts";
import { giveRoles, invite, join, makeClub } from "../helpers/club.ts";
import { keepLog } from "../helpers/keep-log.ts";
import { mailedToken, newestMail } from "../helpers/mailed-token.ts";
import { createPhone, signUpRider, type Rider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

afterEach(() => {
  vi.useRealTimers();
});

async function clubWithOrganiser() {
  const server = await startTestServer();
  const organiser = await signUpRider(server, "Olga");
  return { server, organiser, club: await makeClub(organiser) };
}

const accept = ({ phone }: Rider, token: string) => phone.post(`/api/invites/${token}/accept`);

const invitesOf = async ({ phone }: Rider, clubId: string) =>
  invitesResponseSchema.parse((await phone.get(`/api/clubs/${clubId}/invites`)).body).invites;

/** Signed out, what the link says; signed in, what following it does. */
async function expectDead(server: TestServer, token: string): Promise<void> {
  const stranger = await signUpRider(server, "Una");
  const answers = [
    await createPhone(server).get(`/api/invites/${token}`),
    await accept(stranger, token),
    await createPhone(server).get("/api/invites/never-made"),
  ];
  for (const { status, body } of answers) {
    expect(status).toBe(404);
    expect(body).toEqual(answers[2]!.body);
    expect(body).toHaveProperty("detail", expect.stringContaining("Ask for a new one"));
  }
  expect((await stranger.phone.get("/api/clubs")).body).toEqual({ clubs: [] });
}

describe("an invite", () => {
  it("names the club to whoever has the link, and lets one person join as a rider", async () => {
    const { server, organiser, club } = await clubWithOrganiser();
    const { url, token, invite: made } = await invite(organiser, club.id);
    expect(url).toBe(`${server.origin}/join?token=${token}`);
    expect(made).toMatchObject({ email: null, usesLeft: 1 });
    const told = await createPhone(server).get(`/api/invites/${token}`).expect(200);
    expect(told.body).toEqual({ club: { id: club.id, name: club.name } });
    const joined = await join(await signUpRider(server), token);
    expect(joined.body).toEqual({ club: { ...club, organiser: false, mechanic: false } });
    expect(await invitesOf(organiser, club.id)).toEqual([]);
    await expectDead(server, token);
  });

  it("lets as many join as it is for, a member who follows it again taking no use", async () => {
    const { server, organiser, club } = await clubWithOrganiser();
    const { token } = await invite(organiser, club.id, { uses: 2 });
    const [first, second] = [await signUpRider(server), await signUpRider(server)];
    await join(first, token);
    await join(first, token);
    await join(organiser, token);
    expect(await invitesOf(organiser, club.id)).toMatchObject([{ usesLeft: 1 }]);
    await join(second, token);
    await join(second, token);
    await expectDead(server, token);
  });

  it("for one lets one of many in who follow it at once", async () => {
    const { server, organiser, club } = await clubWithOrganiser();
    const { token } = await invite(organiser, club.id);
    const riders = await Promise.all([1, 2, 3, 4].map(() => signUpRider(server)));
    const answers = await Promise.all(riders.map((rider) => accept(rider, token)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 404, 404, 404]);
  });

  it("ends after its days", async () => {
    const { server, organiser, club } = await clubWithOrganiser();
    const { token } = await invite(organiser, club.id, { days: 3 });
    vi.useFakeTimers({ toFake: ["Date"], now: addDays(new Date(), 4) });
    await expectDead(server, token);
    expect(await invitesOf(organiser, club.id)).toEqual([]);
  });

  it("ends when an organiser revokes it", async () => {
    const { server, organiser, club } = await clubWithOrganiser();
    const { token, invite: made } = await invite(organiser, club.id);
    const path = `/api/clubs/${club.id}/invites/${made.id}`;
    await organiser.phone.delete(path).expect(204);
    await organiser.phone.delete(path).expect(404);
    await expectDead(server, token);
  });

  it.each([
    ["uses", { uses: 0 }],
    ["uses", { uses: 501 }],
    ["days", { days: 91 }],
    ["days", { days: 1.5 }],
    ["email", { email: "nobody" }],
  ])("with wrong %s is not made", async (field, wanted) => {
    const { organiser, club } = await clubWithOrganiser();
    const answer = await organiser.phone.post(`/api/clubs/${club.id}/invites`).send(wanted);
    expect(answer.status).toBe(422);
    expect(Object.keys((answer.body as { errors: object }).errors)).toEqual([field]);
  });

  it("is mailed once the organiser's own address is confirmed, and a link until then", async () => {
    const { server, organiser, club } = await clubWithOrganiser();
    const token = await mailedToken(server, "Confirm your e-mail address");
    const email = "friend@club.example";
    const unmailed = await invite(organiser, club.id, { email });
    expect(unmailed.invite.email).toBeNull();
    await join(await signUpRider(server), unmailed.token);
    await server.mailer.sendDue();
    expect(server.mails().join()).not.toContain(club.name);

    await organiser.phone.post("/api/auth/verify-email").send({ token }).expect(200);
    expect((await invite(organiser, club.id, { email })).invite.email).toBe(email);
    expect(await newestMail(server, "You are asked to join Moor Riders")).toContain(`To: ${email}`);
  });

  it("is kept as a hash, and its token stands in no log", async () => {
    const { log, text } = keepLog("trace");
    const server = await startTestServer({}, log);
    const organiser = await signUpRider(server, "Olga");
    server.store.users.markVerified(organiser.user.id);
    const club = await makeClub(organiser);
    const { token } = await invite(organiser, club.id, { email: "friend@club.example" });
    await join(await signUpRider(server), token);
    await createPhone(server).get(`/api/invites/${token}`).expect(404);
    await server.mailer.sendDue();
    const kept = ["club_invites", "mails"].map((table) =>
      server.database.$client.prepare(`SELECT * FROM ${table}`).all(),
    );
    expect(JSON.stringify(kept)).not.toContain(token);
    expect(text()).toContain("/api/invites/…/accept");
    expect(text()).not.toContain(token);
  });
});

describe("a member whom an organiser removed", () => {
  async function clubAndRider() {
    const { server, organiser, club } = await clubWithOrganiser();
    const rider = await signUpRider(server, "Rex");
    const open = await invite(organiser, club.id, { uses: 50 });
    await join(rider, open.token);
    const remove = ({ phone }: Rider) =>
      phone.delete(`/api/clubs/${club.id}/members/${rider.user.id}`);
    return { server, organiser, club, rider, open, remove };
  }

  it("cannot come back by any link that was open, be it under another name", async () => {
    const { server, organiser, club, rider, open, remove } = await clubAndRider();
    const email = rider.user.email.toUpperCase();
    const made = [
      open,
      await invite(organiser, club.id),
      await invite(organiser, club.id, { email }),
      await invite(organiser, club.id, { email: "friend@club.example" }),
      await invite(organiser, club.id, { email: "all@club.example", uses: 9 }),
    ];
    await remove(organiser).expect(204);
    for (const { token } of made) {
      await accept(rider, token).expect(404);
      await expectDead(server, token);
    }
    expect(await invitesOf(organiser, club.id)).toEqual([]);
  });

  it("cannot come back by an invitation made for another as an organiser", async () => {
    const { organiser, club, rider, remove } = await clubAndRider();
    await giveRoles(organiser, club.id, rider, { organiser: true }).expect(200);
    const { token } = await invite(rider, club.id, { email: "friend@club.example" });
    await remove(organiser).expect(204);
    await accept(rider, token).expect(404);
  });

  it("cannot come back by one that was used before and has a use left", async () => {
    const { server, organiser, club, remove, rider } = await clubAndRider();
    await remove(rider).expect(204);
    const two = await invite(organiser, club.id, { email: "pair@club.example", uses: 2 });
    await join(rider, two.token);
    await remove(organiser).expect(204);
    await accept(rider, two.token).expect(404);
    await expectDead(server, two.token);
  });

  it("is let in again by an invitation that is made afterwards", async () => {
    const { organiser, club, rider, remove } = await clubAndRider();
    await remove(organiser).expect(204);
    const { token } = await invite(organiser, club.id, { email: rider.user.email });
    await join(rider, token);
  });

  it("is another than one who left, to whom the links stay open", async () => {
    const { rider, open, remove } = await clubAndRider();
    await remove(rider).expect(204);
    await join(rider, open.token);
  });
});
