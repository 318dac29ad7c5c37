import { describe, expect, it } from "vitest";
import { clubOfFour, giveRoles, makeClub, withdraw } from "../helpers/club.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  meterEntry,
  newId,
  noteEntry,
  strikeEntry,
  topupEntry,
  workEntry,
} from "../helpers/make-entry.ts";
import { signUpRider, type Rider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const states = ["shared", "withdrawn"] as const;
type State = (typeof states)[number];

/**
 * What becomes of what a person sends to the bike's log: of the owner, the mechanic, the organiser,
 * another member, and the mechanic of another club. After the bar, once the bike is no longer shared.
 */
const byMechanicToo =
  "stored stored not-writable not-writable not-writable | stored not-writable not-writable not-writable not-writable";
const pushes: Record<string, string> = {
  bike: "stored not-writable not-writable not-writable not-writable",
  hours: byMechanicToo,
  check: byMechanicToo,
  work: byMechanicToo,
  meter: byMechanicToo,
  topup: byMechanicToo,
  note: byMechanicToo,
  "strike of one's own": byMechanicToo,
  "strike of another's":
    "stored invalid not-writable not-writable not-writable | stored not-writable not-writable not-writable not-writable",
};
const pulls = "owner mechanic gone gone gone | owner gone gone gone gone";

const expectedIn = (state: State, row: string) =>
  row.split(" | ")[state === "shared" ? 0 : 1] ?? row.split(" | ")[0];

async function makeWorld(state: State) {
  const server = await startTestServer();
  const four = await clubOfFour(server);
  const { owner, mechanic, organiser, member, club, bikeId } = four;
  const outsider = await signUpRider(server, "Una");
  const otherClub = await makeClub(outsider, "Fen Riders");
  await giveRoles(outsider, otherClub.id, outsider, { mechanic: true }).expect(200);
  const written = { owner: noteEntry(bikeId), mechanic: noteEntry(bikeId) };
  await owner.sync([written.owner]);
  await mechanic.sync([written.mechanic]);
  if (state === "withdrawn") await withdraw(owner, bikeId, club.id);
  return {
    bikeId,
    written,
    owner,
    mechanic,
    people: [owner, mechanic, organiser, member, outsider],
  };
}

const entriesOf = (bikeId: string, own: string, anothers: string) => ({
  bike: bikeEntry(bikeId, { year: 2020 }),
  hours: hoursEntry(bikeId, 34),
  check: checkEntry(bikeId, 34, 3),
  work: workEntry(bikeId, 34, ["line-bled"]),
  meter: meterEntry(bikeId, 34, 0),
  topup: topupEntry(bikeId, 300),
  note: noteEntry(bikeId),
  "strike of one's own": strikeEntry(bikeId, own),
  "strike of another's": strikeEntry(bikeId, anothers),
});

describe.each(states)("a bike that is %s", (state) => {
  it("takes entries of those who may write them, and refuses the rest in the same words", async () => {
    const { bikeId, written, mechanic, people } = await makeWorld(state);
    const outcomes: Record<string, string[]> = {};
    for (const person of people) {
      const [own, anothers] =
        person === mechanic
          ? [written.mechanic.id, written.owner.id]
          : [written.owner.id, written.mechanic.id];
      const entries = entriesOf(bikeId, own, anothers);
      const { results } = await person.sync(Object.values(entries));
      Object.keys(entries).forEach((what, n) =>
        (outcomes[what] ??= []).push(results[n]!.reason ?? results[n]!.status),
      );
    }
    const joined = Object.entries(outcomes).map(([what, all]) => [what, all.join(" ")]);
    const expected = Object.entries(pushes).map(([what, row]) => [what, expectedIn(state, row)]);
    expect(Object.fromEntries(joined)).toEqual(Object.fromEntries(expected));
  });

  it("is sent to phones that list it and may read it, and gone from the others", async () => {
    const { bikeId, people } = await makeWorld(state);
    const seen = async (person: Rider) => {
      const { bikes, gone } = await person.sync([], { known: { [bikeId]: 0 } });
      return bikes[0]?.access ?? (gone.includes(bikeId) ? "gone" : "nothing");
    };
    const all: string[] = [];
    for (const person of people) all.push(await seen(person));
    expect(all.join(" ")).toBe(expectedIn(state, pulls));
  });
});

describe("a mechanic's sync", () => {
  it("brings a shared bike only once the phone lists it, with who wrote what", async () => {
    const { bikeId, mechanic, owner } = await makeWorld("shared");
    expect((await mechanic.sync([])).bikes).toEqual([]);
    const { bikes } = await mechanic.sync([], { known: { [bikeId]: 0 } });
    const authors = bikes[0]!.entries.map(({ author }) => author.name);
    expect(authors).toEqual(["Ann", "Ann", "Ann", "Ann", "Ann", "Ann", "Mick"]);
    const owners = await owner.sync([]);
    expect(owners.bikes[0]!.entries).toEqual(bikes[0]!.entries);
  });

  it("says why another's entry is not struck", async () => {
    const { bikeId, mechanic, written } = await makeWorld("shared");
    const { results } = await mechanic.sync([strikeEntry(bikeId, written.owner.id)]);
    expect(results[0]).toMatchObject({
      reason: "invalid",
      errors: { "body.entryId": expect.stringContaining("can strike it") as string },
    });
  });

  it("honours no strike of another's entry that came before it", async () => {
    const { bikeId, mechanic, owner } = await makeWorld("shared");
    const check = checkEntry(bikeId, 40, 3, "2026-05-02T09:00:00.000Z");
    const { results } = await mechanic.sync([strikeEntry(bikeId, check.id)]);
    expect(results[0]!.status).toBe("stored");
    await owner.sync([check]);
    expect((await owner.summary(bikeId)).checks.map(({ entryId }) => entryId)).toContain(check.id);
  });

  it("keeps the mechanic's entries in the owner's log when sharing ends, and takes no more", async () => {
    const { bikeId, mechanic, owner, written } = await makeWorld("withdrawn");
    const { results } = await mechanic.sync([noteEntry(bikeId), written.mechanic]);
    expect(results).toMatchObject([{ reason: "not-writable" }, { status: "duplicate" }]);
    const { bikes } = await owner.sync([]);
    expect(bikes[0]!.entries.map(({ id }) => id)).toContain(written.mechanic.id);
  });

  it("registers no bike under the id of one that is there", async () => {
    const { bikeId, mechanic, owner } = await makeWorld("shared");
    const { results } = await mechanic.sync([bikeEntry(bikeId, { name: "Mine" })]);
    expect(results[0]!.reason).toBe("not-writable");
    expect((await owner.summary(bikeId)).name).toBe("Moss");
    expect((await mechanic.sync([bikeEntry(newId())])).results[0]!.status).toBe("stored");
  });
});
