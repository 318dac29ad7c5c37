import { describe, expect, it } from "vitest";
import { bikeEntry, hoursEntry, newId, noteEntry, smallLog } from "../helpers/make-entry.ts";
import { createPhone, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

describe("pulling entries", () => {
  it("sends another phone of the rider everything, and then only what is new", async () => {
    const server = await startTestServer();
    const first = await signUpRider(server);
    const [bikeId, still] = [newId(), newId()];
    await first.sync([...smallLog(bikeId), bikeEntry(still)]);

    const second = await signInRider(server, first.user.email);
    const all = await second.sync([]);
    expect(all.bikes.map((bike) => bike.entries.length).sort()).toEqual([1, 5]);
    const known = Object.fromEntries(all.bikes.map((bike) => [bike.bikeId, bike.rev]));
    expect(await second.sync([], { known })).toMatchObject({ bikes: [], gone: [], more: false });

    const added = hoursEntry(bikeId, 40);
    await first.sync([added], { known });
    const { bikes } = await second.sync([], { known });
    expect(bikes).toMatchObject([{ bikeId, entries: [{ id: added.id }] }]);
  });

  it("comes in pages of 2,000, bike by bike, ascending", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const bikeIds = [newId(), newId()];
    const sent = bikeIds.flatMap((bikeId) => [
      bikeEntry(bikeId),
      ...Array.from({ length: 1_499 }, () => noteEntry(bikeId)),
    ]);
    for (let from = 0; from < sent.length; from += 500)
      await rider.sync(sent.slice(from, from + 500));

    const first = await rider.sync([]);
    expect(first.more).toBe(true);
    const known = Object.fromEntries(first.bikes.map((bike) => [bike.bikeId, bike.rev]));
    const second = await rider.sync([], { known });
    expect(second.more).toBe(false);

    const pages = [first, second].map(({ bikes }) => bikes.flatMap((bike) => bike.entries));
    expect(pages.map((page) => page.length)).toEqual([2_000, 1_000]);
    const ids = pages.flat().map(({ id }) => id);
    expect(new Set(ids)).toEqual(new Set(sent.map(({ id }) => id)));
    for (const { entries, rev } of [...first.bikes, ...second.bikes]) {
      const revs = entries.map((entry) => entry.rev);
      expect(revs).toEqual([...revs].sort((a, b) => a - b));
      expect(rev).toBe(revs.at(-1));
    }
  });

  it("has no more where the last page is exactly full", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const sent = [bikeEntry(bikeId), ...Array.from({ length: 1_999 }, () => noteEntry(bikeId))];
    for (let from = 0; from < sent.length; from += 500)
      await rider.sync(sent.slice(from, from + 500));
    const { bikes, more } = await rider.sync([]);
    expect(bikes[0]!.entries).toHaveLength(2_000);
    expect(more).toBe(false);
  });

  it("sends everything again to a phone that last spoke to another life of the database", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const { epoch, bikes } = await rider.sync(smallLog(bikeId));
    const known = { [bikeId]: bikes[0]!.rev };
    expect((await rider.sync([], { known, epoch })).bikes).toEqual([]);
    expect((await rider.sync([], { known, epoch: "another" })).bikes[0]!.entries).toHaveLength(5);
  });

  it("calls gone what a phone lists and may not see, whether it exists or not", async () => {
    const server = await startTestServer();
    const owner = await signUpRider(server);
    const [owned, nowhere] = [newId(), newId()];
    await owner.sync(smallLog(owned));
    const stranger = await signUpRider(server, "Bob");
    const { bikes, gone } = await stranger.sync([], { known: { [owned]: 0, [nowhere]: 4 } });
    expect(bikes).toEqual([]);
    expect(gone).toEqual([owned, nowhere]);
  });
});

describe("someone else's bike", () => {
  it("is not found, like one that is not there", async () => {
    const server = await startTestServer();
    const owner = await signUpRider(server);
    const bikeId = newId();
    await owner.sync(smallLog(bikeId));
    const { phone } = await signUpRider(server, "Bob");
    const answers = [
      await phone.get(`/api/bikes/${bikeId}`),
      await phone.get(`/api/bikes/${newId()}`),
      await phone.delete(`/api/bikes/${bikeId}`),
      await phone.delete(`/api/bikes/${newId()}`),
    ];
    for (const answer of answers) {
      expect(answer.status).toBe(404);
      expect(answer.body).toEqual(answers[0]!.body);
    }
    expect((await phone.get("/api/bikes")).body).toEqual({ bikes: [] });
    expect((await owner.summary(bikeId)).bikeId).toBe(bikeId);
  });

  it("and one's own need a session", async () => {
    const server = await startTestServer();
    const phone = createPhone(server);
    const answers = [
      await phone.get("/api/bikes"),
      await phone.get(`/api/bikes/${newId()}`),
      await phone.delete(`/api/bikes/${newId()}`),
      await phone.post("/api/sync").send({ known: {}, entries: [] }),
      await phone.get("/api/export"),
      await phone.delete("/api/account").send({ password: "x" }),
      await phone.get("/api/auth/me"),
    ];
    for (const answer of answers) {
      expect(answer.status).toBe(401);
      expect(answer.type).toBe("application/problem+json");
    }
  });
});
