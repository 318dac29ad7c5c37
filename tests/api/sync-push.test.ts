import { describe, expect, it } from "vitest";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  smallLog,
  strikeEntry,
} from "../helpers/make-entry.ts";
import { riderWithBike, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

const countRows = ({ database }: TestServer) =>
  database.$client.prepare("SELECT count(*) FROM entries").pluck().get();

const withoutIds = (summary: unknown): unknown =>
  JSON.parse(JSON.stringify(summary).replaceAll(/[\da-f]{8}-[\da-f-]{27}/g, "an id"));

describe("pushing entries", () => {
  it("stores them, in the order of what was sent, and sends them back as they were", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const sent = smallLog(bikeId);
    const { results, bikes } = await rider.sync(sent);
    expect(results).toEqual(sent.map(({ id }, index) => ({ index, id, status: "stored" })));
    const [bike] = bikes;
    expect(bike).toMatchObject({ bikeId, access: "owner" });
    expect(bike!.entries.map(({ author: _a, receivedAt: _r, rev: _v, ...entry }) => entry)).toEqual(
      sent,
    );
    for (const entry of bike!.entries)
      expect(entry.author).toEqual({ id: rider.user.id, name: rider.user.name });
    const revs = bike!.entries.map(({ rev }) => rev);
    expect(revs).toEqual([...revs].sort((a, b) => a - b));
    expect(bike!.rev).toBe(revs.at(-1));
  });

  it("registers a bike before the entries that a call holds ahead of it", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const { results } = await rider.sync([hoursEntry(bikeId, 12), bikeEntry(bikeId)]);
    expect(results.map(({ status }) => status)).toEqual(["stored", "stored"]);
  });

  it("answers a repeat as a duplicate, whatever the order of its keys", async () => {
    const server = await startTestServer();
    const { rider, bikeId } = await riderWithBike(server);
    const check = checkEntry(bikeId, 12, 3);
    const reordered = {
      ...Object.fromEntries(Object.entries(check).reverse()),
      body: Object.fromEntries(Object.entries(check.body).reverse()),
    };
    const { results } = await rider.sync([check, check, reordered]);
    expect(results.map(({ status }) => status)).toEqual(["stored", "duplicate", "duplicate"]);
    expect(countRows(server)).toBe(2);
  });

  it("takes a level of minus zero for the zero that was stored", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const text = JSON.stringify({ known: {}, entries: [checkEntry(bikeId, 12, 3)] });
    const minusZero = text.replace('"startMl":0', '"startMl":-0');
    for (const status of ["stored", "duplicate"]) {
      const response = await rider.phone.post("/api/sync").type("json").send(minusZero);
      expect(response.body).toMatchObject({ results: [{ status }] });
    }
  });

  it("judges each entry alone: one bad entry never blocks another", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const good = hoursEntry(bikeId, 12);
    const { results } = await rider.sync([7, { ...good, id: newId(), hours: -1 }, null, good]);
    expect(results.map(({ status }) => status)).toEqual([
      "refused",
      "refused",
      "refused",
      "stored",
    ]);
  });

  it("keeps 320 typed for 32.0", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const log = smallLog(bikeId, 2.95).slice(1);
    await rider.sync(log);
    const due = (await rider.summary(bikeId)).due;
    const { results } = await rider.sync([hoursEntry(bikeId, 320, "2026-04-10T09:00:00.000Z")]);
    expect(results).toMatchObject([{ status: "stored" }]);
    const summary = await rider.summary(bikeId);
    expect(summary.due).toEqual(due);
    expect(summary.hours.doubtful).toMatchObject([{ atHours: 320, why: "faster-than-clock" }]);
  });

  it("takes a strike ahead of the entry it strikes", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const wrong = hoursEntry(bikeId, 90);
    await rider.sync([hoursEntry(bikeId, 12), strikeEntry(bikeId, wrong.id)]);
    await rider.sync([wrong]);
    expect((await rider.summary(bikeId)).hours.now).toBe(12);
  });

  it("ends the same however often, in whatever order and from how many phones it is sent", async () => {
    const server = await startTestServer();
    const first = await signUpRider(server);
    const second = await signInRider(server, first.user.email);
    const [once, reversed, twice] = [smallLog(newId()), smallLog(newId()), smallLog(newId())];
    const half = twice.slice(0, 3);

    await first.sync(once);
    await first.sync(once);
    await first.sync([...reversed].reverse());
    await Promise.all([
      first.sync(twice),
      second.sync(half),
      first.sync([...half].reverse()),
      second.sync(twice),
    ]);

    expect(countRows(server)).toBe(15);
    const summaries = await Promise.all(
      [once, reversed, twice].map(([entry]) => second.summary(entry!.bikeId)),
    );
    const [likeOnce, ...others] = summaries.map(withoutIds);
    expect(others).toEqual([likeOnce, likeOnce]);
  });
});

describe("the summary of a bike", () => {
  it.each([
    { endMl: 2.5, verdict: "low", action: "stop", dueAt: 32 },
    { endMl: 2.7, verdict: "dropping", action: "repeat", dueAt: 32 },
    { endMl: 2.95, verdict: "holding", action: "ride", dueAt: 52 },
  ])("finds 3.0 → $endMl mL to be $verdict: $action", async ({ endMl, ...expected }) => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    await rider.sync(smallLog(bikeId, endMl));
    const { verdict, action, due } = await rider.summary(bikeId);
    expect({ verdict, action, dueAt: due.atHours }).toEqual(expected);
  });

  it("is the same in the list of one's bikes", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeIds = [newId(), newId()];
    await rider.sync(bikeIds.flatMap((bikeId) => smallLog(bikeId)));
    const { body } = (await rider.phone.get("/api/bikes")) as { body: { bikes: unknown[] } };
    expect(body.bikes).toEqual(await Promise.all(bikeIds.map((id) => rider.summary(id))));
  });
});
