import { describe, expect, it } from "vitest";
import {
  clubsResponseSchema,
  membersResponseSchema,
  sharesResponseSchema,
} from "../../shared/schemas/club.ts";
import { clubOfFour, giveRoles, invite, join, lineUp, makeClub, share } from "../helpers/club.ts";
import { bikeEntry, newId } from "../helpers/make-entry.ts";
import { PASSWORD, signUpRider, type Rider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

async function membersOf({ phone }: Rider, clubId: string) {
  const answer = await phone.get(`/api/clubs/${clubId}/members`).expect(200);
  return membersResponseSchema.parse(answer.body).members;
}
const namesSeenBy = async (rider: Rider, clubId: string) =>
  (await membersOf(rider, clubId)).map(({ name }) => name);

const clubsOf = async ({ phone }: Rider) =>
  clubsResponseSchema.parse((await phone.get("/api/clubs").expect(200)).body).clubs;

const remove = ({ phone }: Rider, clubId: string, { user }: Rider) =>
  phone.delete(`/api/clubs/${clubId}/members/${user.id}`);

describe("a club", () => {
  it("is made by its first organiser, who is no mechanic yet", async () => {
    const rider = await signUpRider(await startTestServer());
    const club = await makeClub(rider, "Moor Riders");
    expect(club).toMatchObject({ name: "Moor Riders", organiser: true, mechanic: false });
    expect(await clubsOf(rider)).toEqual([club]);
  });

  it("needs a name", async () => {
    const { phone } = await signUpRider(await startTestServer());
    const answer = await phone.post("/api/clubs").send({ name: " " });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ errors: { name: "Give the club a name." } });
  });

  it("is one of several that a person is in, in another role each", async () => {
    const server = await startTestServer();
    const { mechanic, organiser } = await clubOfFour(server);
    const own = await makeClub(mechanic, "Fen Riders");
    await join(organiser, (await invite(mechanic, own.id)).token);
    const roles = (rider: Rider) =>
      clubsOf(rider).then((clubs) => clubs.map((club) => [club.organiser, club.mechanic]));
    expect(await roles(mechanic)).toEqual([[true, false], [false, true]]); // prettier-ignore
    expect(await roles(organiser)).toEqual([[false, false], [true, false]]); // prettier-ignore
  });

  it("closed by an organiser is gone for everyone, with all that was shared with it", async () => {
    const server = await startTestServer();
    const { organiser, mechanic, owner, club, invited, bikeId } = await clubOfFour(server);
    await organiser.phone.delete(`/api/clubs/${club.id}`).expect(204);
    expect(await clubsOf(owner)).toEqual([]);
    await mechanic.phone.get(`/api/bikes/${bikeId}`).expect(404);
    await mechanic.phone.get(`/api/clubs/${club.id}/line-up`).expect(404);
    await owner.phone.get(`/api/invites/${invited.token}`).expect(404);
    expect((await owner.summary(bikeId)).bikeId).toBe(bikeId);
  });
});

describe("the members of a club", () => {
  it("are all seen by its organisers; by others, themselves and those who do something for them", async () => {
    const { organiser, mechanic, owner, member, club } = await clubOfFour(await startTestServer());
    expect(await namesSeenBy(organiser, club.id)).toEqual(["Olga", "Mick", "Ann", "Bob"]);
    expect(await namesSeenBy(mechanic, club.id)).toEqual(["Olga", "Mick"]);
    expect(await namesSeenBy(owner, club.id)).toEqual(["Olga", "Mick", "Ann"]);
    expect(await namesSeenBy(member, club.id)).toEqual(["Olga", "Mick", "Bob"]);
  });

  it("are told without addresses", async () => {
    const { organiser, club } = await clubOfFour(await startTestServer());
    const { text } = await organiser.phone.get(`/api/clubs/${club.id}/members`);
    expect(text).not.toContain("@");
  });

  it("are given roles and have them taken, one without touching the other", async () => {
    const { organiser, member, club } = await clubOfFour(await startTestServer());
    const made = await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    expect(made.body).toMatchObject({ member: { organiser: false, mechanic: true } });
    await giveRoles(organiser, club.id, member, { organiser: true }).expect(200);
    const taken = await giveRoles(organiser, club.id, member, { mechanic: false }).expect(200);
    expect(taken.body).toMatchObject({ member: { organiser: true, mechanic: false } });
    await giveRoles(member, club.id, organiser, { organiser: false }).expect(200);
    await giveRoles(organiser, club.id, member, { organiser: false }).expect(404);
  });

  it("who are none, are not found", async () => {
    const server = await startTestServer();
    const { organiser, club } = await clubOfFour(server);
    const stranger = await signUpRider(server, "Una");
    await giveRoles(organiser, club.id, stranger, { mechanic: true }).expect(404);
    await remove(organiser, club.id, stranger).expect(404);
  });
});

describe("the last organiser", () => {
  it("can neither step down nor leave, and is told what to do", async () => {
    const { organiser, club } = await clubOfFour(await startTestServer());
    const answers = [
      await giveRoles(organiser, club.id, organiser, { organiser: false }),
      await remove(organiser, club.id, organiser),
    ];
    for (const { status, body } of answers) {
      expect(status).toBe(409);
      expect(body).toMatchObject({
        detail: expect.stringContaining("Make another member organiser first") as string,
      });
    }
    await giveRoles(organiser, club.id, organiser, { mechanic: true }).expect(200);
  });

  it("may go once there is another", async () => {
    const { organiser, member, club } = await clubOfFour(await startTestServer());
    await giveRoles(organiser, club.id, member, { organiser: true }).expect(200);
    await remove(organiser, club.id, organiser).expect(204);
    expect(await clubsOf(organiser)).toEqual([]);
    await remove(member, club.id, member).expect(409);
  });

  it("whose account is erased leaves the club to its mechanic", async () => {
    const { organiser, mechanic, club } = await clubOfFour(await startTestServer());
    await organiser.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    expect(await clubsOf(mechanic)).toMatchObject([{ id: club.id, organiser: true }]);
    expect(await namesSeenBy(mechanic, club.id)).toEqual(["Mick", "Ann", "Bob"]);
  });

  it("whose account is erased leaves a club of riders to who has been in it longest", async () => {
    const { organiser, mechanic, owner, club } = await clubOfFour(await startTestServer());
    await remove(mechanic, club.id, mechanic).expect(204);
    await organiser.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    expect(await clubsOf(owner)).toMatchObject([{ organiser: true, mechanic: false }]);
  });

  it("whose account is erased ends a club of one", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const club = await makeClub(rider);
    await invite(rider, club.id, { email: "friend@club.example" });
    await rider.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    const left = ["clubs", "club_members", "club_invites", "bike_shares"].map((table) =>
      server.database.$client.prepare(`SELECT count(*) FROM ${table}`).pluck().get(),
    );
    expect(left).toEqual([0, 0, 0, 0]);
  });
});

describe("sharing", () => {
  const sharesOf = async ({ phone }: Rider, bikeId: string) =>
    sharesResponseSchema.parse((await phone.get(`/api/bikes/${bikeId}/shares`)).body).shares;

  it("is off until the owner turns it on, and shows who can see the bike", async () => {
    const { owner, club, bikeId } = await clubOfFour(await startTestServer());
    const unshared = newId();
    await owner.sync([bikeEntry(unshared)]);
    expect(await sharesOf(owner, unshared)).toEqual([]);
    expect(await sharesOf(owner, bikeId)).toMatchObject([
      { club: { id: club.id, name: "Moor Riders" }, mechanics: ["Mick"] },
    ]);
  });

  it("twice is sharing once", async () => {
    const { owner, mechanic, club, bikeId } = await clubOfFour(await startTestServer());
    const before = await sharesOf(owner, bikeId);
    await share(owner, bikeId, club.id);
    expect(await sharesOf(owner, bikeId)).toEqual(before);
    expect((await lineUp(mechanic, club.id)).bikes).toHaveLength(1);
  });

  it.each([
    ["the owner leaves", ({ owner, club }) => remove(owner, club.id, owner)],
    ["the owner is removed", ({ organiser, owner, club }) => remove(organiser, club.id, owner)],
    ["the bike is erased", ({ owner, bikeId }) => owner.phone.delete(`/api/bikes/${bikeId}`)],
    [
      "the owner's account is erased",
      ({ owner }) => owner.phone.delete("/api/account").send({ password: PASSWORD }),
    ],
  ] satisfies [string, (four: Awaited<ReturnType<typeof clubOfFour>>) => unknown][])(
    "ends when %s",
    async (_what, end) => {
      const four = await clubOfFour(await startTestServer());
      const { mechanic, club, bikeId } = four;
      expect((await lineUp(mechanic, club.id)).bikes).toHaveLength(1);
      expect(await end(four)).toMatchObject({ status: 204 });
      expect((await lineUp(mechanic, club.id)).bikes).toEqual([]);
      await mechanic.phone.get(`/api/bikes/${bikeId}`).expect(404);
      expect((await mechanic.sync([], { known: { [bikeId]: 1 } })).gone).toEqual([bikeId]);
    },
  );

  it("ends for a mechanic who is one no more, or is removed", async () => {
    const { organiser, mechanic, member, club, bikeId } = await clubOfFour(await startTestServer());
    await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    await giveRoles(organiser, club.id, mechanic, { mechanic: false }).expect(200);
    await remove(organiser, club.id, member).expect(204);
    for (const rider of [mechanic, member]) {
      await rider.phone.get(`/api/bikes/${bikeId}`).expect(404);
      expect((await rider.sync([], { known: { [bikeId]: 1 } })).gone).toEqual([bikeId]);
    }
  });

  it("comes along in the file of one's own data", async () => {
    const { owner, club, bikeId } = await clubOfFour(await startTestServer());
    const exported = await owner.phone.get("/api/export").expect(200);
    expect(exported.body).toMatchObject({
      clubs: [{ id: club.id, organiser: false, mechanic: false }],
      reminders: { dueMails: true, stopMails: true },
      bikes: [{ bikeId, sharedWith: [{ id: club.id }] }],
    });
  });
});
