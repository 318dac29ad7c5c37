import { describe, expect, it } from "vitest";
import { bikeTag } from "../../shared/logbook/bike-tag.ts";
import type { LineUpRow } from "../../shared/schemas/club.ts";
import { clubOfFour, lineUp, share, withdraw, type ClubOfFour } from "../helpers/club.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  smallLog,
  strikeEntry,
} from "../helpers/make-entry.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

/** Another bike of the owner's, shared, with so many hours since its one check. */
async function shareBike({ owner, club }: ClubOfFour, name: string, hoursSince: number) {
  const bikeId = newId();
  const check = checkEntry(bikeId, 12, 3, "2026-03-02T09:00:00.000Z");
  const hours = hoursEntry(bikeId, 12 + hoursSince, "2026-04-09T09:00:00.000Z");
  await owner.sync([bikeEntry(bikeId, { name }), check, hours]);
  await share(owner, bikeId, club.id);
  return bikeId;
}

const boardOf = ({ mechanic, club }: ClubOfFour, headers = {}) =>
  mechanic.phone.get(`/api/clubs/${club.id}/line-up`).set(headers);

describe("the Line-up", () => {
  it("shows of a bike what a mechanic needs, and of its owner the name", async () => {
    const four = await clubOfFour(await startTestServer());
    const { bikes, next } = await lineUp(four.mechanic, four.club.id);
    expect(next).toBeNull();
    expect(bikes).toMatchObject([
      {
        bikeId: four.bikeId,
        name: "Moss",
        tag: bikeTag(four.bikeId),
        owner: { id: four.owner.user.id, name: "Ann" },
        place: "stop",
        action: "stop",
        verdict: "low",
        hoursNow: 33,
        dueInHours: -1,
        lastCheckAt: "2026-04-02T09:00:00.000Z",
        pumpHours: null,
        lowCheckStruck: false,
      },
    ] satisfies Partial<LineUpRow>[]);
    expect((await boardOf(four)).text).not.toContain("@");
  });

  it("stands worst first, and within a place by the hours left", async () => {
    const four = await clubOfFour(await startTestServer());
    await shareBike(four, "settling", 1);
    await shareBike(four, "nearly due", 16);
    await shareBike(four, "over", 21);
    await shareBike(four, "far over", 40);
    await shareBike(four, "settling, ridden", 9);
    const { bikes } = await lineUp(four.mechanic, four.club.id);
    expect(bikes.map(({ name }) => name)).toEqual([
      "Moss",
      "far over",
      "over",
      "nearly due",
      "settling, ridden",
      "settling",
    ]);
  });

  it("comes in pages that together are the board, each bike once", async () => {
    const four = await clubOfFour(await startTestServer());
    // Alike in place and hours, too.
    for (let n = 0; n < 6; n++) await shareBike(four, `Bike ${n}`, n < 3 ? 21 : 1);
    const all = await lineUp(four.mechanic, four.club.id);
    const paged: LineUpRow[] = [];
    let after: string | null = "";
    for (let pages = 0; after !== null && pages < 9; pages++) {
      const query: string = `?limit=2${after && `&after=${after}`}`;
      const page = await lineUp(four.mechanic, four.club.id, query);
      paged.push(...page.bikes);
      after = page.next;
    }
    expect(paged).toEqual(all.bikes);
    expect(paged).toHaveLength(7);
  });

  it.each(["?limit=0", "?limit=201", "?limit=many", "?after=nowhere", "?after=bnVsbA"])(
    "is not asked for by %s",
    async (query) => {
      const { mechanic, club } = await clubOfFour(await startTestServer());
      await mechanic.phone.get(`/api/clubs/${club.id}/line-up${query}`).expect(422);
    },
  );

  it("follows what is written: a stop by hand, a low check struck, another owner's word", async () => {
    const four = await clubOfFour(await startTestServer());
    const { owner, mechanic, club, log, bikeId } = four;
    const row = async () => (await lineUp(mechanic, club.id)).bikes[0];
    await owner.sync([strikeEntry(bikeId, log[3]!.id)]);
    expect(await row()).toMatchObject({ place: "overdue", lowCheckStruck: true });
    await mechanic.sync([noteEntry(bikeId, "The hose has gone soft.", "stop")]);
    expect(await row()).toMatchObject({ place: "stop", action: "ride", stopAdvised: true });
    await owner.sync([noteEntry(bikeId, "Hose renewed.", "ride")]);
    expect(await row()).toMatchObject({ place: "overdue", stopAdvised: false });
  });

  it("leaves out a bike whose sharing ended, at once", async () => {
    const four = await clubOfFour(await startTestServer());
    await withdraw(four.owner, four.bikeId, four.club.id);
    expect((await lineUp(four.mechanic, four.club.id)).bikes).toEqual([]);
  });
});

describe("an unchanged Line-up", () => {
  it("is not sent again, and a changed one is", async () => {
    const four = await clubOfFour(await startTestServer());
    const first = await boardOf(four);
    // As a browser asks that is to keep nothing of it in a cache of its own.
    const known = { "If-None-Match": first.headers.etag, "Cache-Control": "no-cache" };
    const again = await boardOf(four, known);
    expect([again.status, again.text]).toEqual([304, ""]);
    for (const { headers } of [first, again]) expect(headers["cache-control"]).toBe("no-store");
    await four.owner.sync([hoursEntry(four.bikeId, 34, "2026-04-12T09:00:00.000Z")]);
    const changed = await boardOf(four, known);
    expect(changed.status).toBe(200);
    expect(changed.body).toMatchObject({ bikes: [{ hoursNow: 34 }] });
  });

  it("stays so while something is written that does not show on it", async () => {
    const four = await clubOfFour(await startTestServer());
    const { etag } = (await boardOf(four)).headers;
    await four.owner.sync([noteEntry(four.bikeId), ...smallLog(newId())]);
    await boardOf(four, { "If-None-Match": etag }).expect(304);
  });

  it("is answered without asking the database for the board", async () => {
    const server = await startTestServer();
    const four = await clubOfFour(server);
    const before = (await boardOf(four)).text;
    // Behind the server's back, without a word to the club: only a board read anew would show it.
    server.database.$client.exec("DELETE FROM bike_shares");
    expect((await boardOf(four)).text).toBe(before);
  });

  it("is not told to someone who is its mechanic no more", async () => {
    const four = await clubOfFour(await startTestServer());
    const { etag } = (await boardOf(four)).headers;
    const path = `/api/clubs/${four.club.id}/members/${four.mechanic.user.id}`;
    await four.organiser.phone.delete(path).expect(204);
    await boardOf(four, { "If-None-Match": etag }).expect(404);
  });
});

it("a page of the Line-up is read off its index, whatever the log and the board hold", async () => {
  const { database, store } = await startTestServer();
  const { sql, params } = store.bikeShares.boardQuery();
  const plan = database.$client.prepare(`EXPLAIN QUERY PLAN ${sql}`).all(params.map(() => 0)) as {
    detail: string;
  }[];
  const steps = plan.map(({ detail }) => detail);
  expect(steps[0]).toMatch(/^SEARCH bike_shares USING (COVERING )?INDEX bike_shares_line_up/);
  expect(steps.slice(1).every((step) => step.startsWith("SEARCH"))).toBe(true);
  expect(steps.join()).not.toMatch(/entries|SCAN|TEMP B-TREE/);
});

it("a summary of an older server is completed when a newer one starts", async () => {
  const server = await startTestServer();
  const four = await clubOfFour(server);
  const before = await lineUp(four.mechanic, four.club.id);
  const { $client } = server.database;
  $client.exec("DELETE FROM line_up_facts");
  $client.exec("UPDATE bike_shares SET rank = 0");
  expect(server.services.completeSummaries()).toBe(1);
  expect(server.services.completeSummaries()).toBe(0);
  expect(await lineUp(four.mechanic, four.club.id)).toEqual(before);
});
