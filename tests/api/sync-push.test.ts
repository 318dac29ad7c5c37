import { describe, expect, it } from "vitest";
import { MAX_ENTRIES_PER_BIKE } from "../../shared/schemas/entry.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  smallLog,
  strikeEntry,
} from "../helpers/make-entry.ts";
import { signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

const refusal = (id: string | null, reason: string, errors?: object) => ({
  index: 0,
  id,
  status: "refused",
  reason,
  ...(errors && { errors }),
});

async function riderWithBike(server: TestServer) {
  const rider = await signUpRider(server);
  const bikeId = newId();
  await rider.sync([bikeEntry(bikeId)]);
  return { rider, bikeId };
}

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

  it("refuses what is no entry, without an id", async () => {
    const { rider } = await riderWithBike(await startTestServer());
    for (const nothing of [7, null, "entry", [], {}, { kind: "hours" }, { id: 5 }]) {
      const { results } = await rider.sync([nothing]);
      expect(results).toMatchObject([refusal(null, "invalid", {})]);
    }
  });

  it("says by field, in a sentence, what is wrong with an entry", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const wrong: [object, Record<string, string>][] = [
      [
        { ...checkEntry(bikeId, 12, 3), body: { ...checkEntry(bikeId, 12, -1).body } },
        { "body.runs.0.endMl": "A level cannot be negative." },
      ],
      [
        checkEntry(bikeId, 12, 5.6),
        { "body.runs.0.endMl": "This level is far beyond the 5 mL barrel." },
      ],
      [
        {
          ...checkEntry(bikeId, 12, 3),
          body: { syringe: null, runs: [{ startMl: 2, endMl: 1 }], closedOut: true },
        },
        { "body.runs.0.endMl": "The end level is below the start level." },
      ],
      [hoursEntry(bikeId, -1), { hours: "Engine hours cannot be negative." }],
      [hoursEntry(bikeId, 100_001), { hours: "Engine hours is beyond 100,000 hours." }],
      [
        noteEntry(bikeId, "x".repeat(10_000)),
        { "body.text": "The note is too long: at most 2,000 characters." },
      ],
      [{ ...noteEntry(bikeId), extra: 1 }, { extra: "This field is not known here." }],
      [
        { ...hoursEntry(bikeId, 1), at: "yesterday" },
        { at: "This is not a date and time in ISO 8601." },
      ],
    ];
    for (const [entry, errors] of wrong) {
      const { results } = await rider.sync([entry]);
      expect(results).toEqual([refusal((entry as { id: string }).id, "invalid", errors)]);
    }
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

  it("refuses kinds and versions that only a newer app knows", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const entry = hoursEntry(bikeId, 12);
    for (const newer of [
      { ...entry, kind: "photo", body: { file: "x" } },
      { ...entry, v: 2, body: { more: 1 } },
    ])
      expect((await rider.sync([newer])).results).toEqual([refusal(entry.id, "unknown-kind")]);
    expect((await rider.sync([entry])).results).toMatchObject([{ status: "stored" }]);
  });

  it("refuses an id that holds something else, and overwrites nothing", async () => {
    const server = await startTestServer();
    const { rider, bikeId } = await riderWithBike(server);
    const entry = hoursEntry(bikeId, 12);
    await rider.sync([entry]);
    const other = { ...entry, hours: 13 };
    expect((await rider.sync([other])).results).toEqual([refusal(entry.id, "id-taken")]);

    const stranger = await riderWithBike(server);
    const theirs = { ...entry, bikeId: stranger.bikeId };
    expect((await stranger.rider.sync([theirs])).results).toEqual([refusal(entry.id, "id-taken")]);
    expect((await rider.summary(bikeId)).hours.now).toBe(12);
  });

  it("refuses in the same words a bike that is another's and one that is not", async () => {
    const server = await startTestServer();
    const { bikeId } = await riderWithBike(server);
    const stranger = await signUpRider(server, "Bob");
    for (const id of [bikeId, newId()]) {
      const entry = hoursEntry(id, 12);
      expect((await stranger.sync([entry])).results).toEqual([refusal(entry.id, "not-writable")]);
    }
    const seizure = bikeEntry(bikeId, { name: "Mine now" });
    expect((await stranger.sync([seizure])).results).toEqual([refusal(seizure.id, "not-writable")]);
    const nameless = bikeEntry(newId(), { make: "Gorse" });
    expect((await stranger.sync([nameless])).results).toEqual([
      refusal(nameless.id, "not-writable"),
    ]);
  });

  it("takes what was not writable once its bike is there", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const entry = hoursEntry(bikeId, 12);
    expect((await rider.sync([entry])).results).toEqual([refusal(entry.id, "not-writable")]);
    const { results } = await rider.sync([entry, bikeEntry(bikeId)]);
    expect(results.map(({ status }) => status)).toEqual(["stored", "stored"]);
  });

  it("never lets a bike's details or a strike be struck", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const details = bikeEntry(bikeId, { make: "Gorse" });
    const note = noteEntry(bikeId);
    const strike = strikeEntry(bikeId, note.id);
    await rider.sync([details, note, strike]);
    for (const target of [details, strike]) {
      const wrong = strikeEntry(bikeId, target.id);
      expect((await rider.sync([wrong])).results).toEqual([
        refusal(wrong.id, "invalid", {
          "body.entryId": "The bike's own details and strikes cannot be struck.",
        }),
      ]);
    }
  });

  it("takes a strike ahead of the entry it strikes", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const wrong = hoursEntry(bikeId, 90);
    await rider.sync([hoursEntry(bikeId, 12), strikeEntry(bikeId, wrong.id)]);
    await rider.sync([wrong]);
    expect((await rider.summary(bikeId)).hours.now).toBe(12);
  });

  it("says when a bike's log is full", async () => {
    const server = await startTestServer();
    const { rider, bikeId } = await riderWithBike(server);
    const row = { bikeId, kind: "note", v: 1, at: "2026-03-01T09:00:00.000Z", hours: null };
    server.store.write(() => {
      for (let n = 1; n < MAX_ENTRIES_PER_BIKE; n++)
        server.store.entries.add({
          ...row,
          id: newId(),
          body: { text: "Ridden" },
          authorId: rider.user.id,
          receivedAt: row.at,
        });
    });
    const entry = noteEntry(bikeId);
    expect((await rider.sync([entry])).results).toEqual([
      refusal(entry.id, "invalid", { bikeId: "This bike's log is full: at most 10,000 entries." }),
    ]);
  });

  it("stores nothing for another account than the one signed in", async () => {
    const server = await startTestServer();
    const { rider, bikeId } = await riderWithBike(server);
    const sent = { account: newId(), known: {}, entries: [hoursEntry(bikeId, 12)] };
    const response = await rider.phone.post("/api/sync").send(sent);
    expect(response.status).toBe(409);
    expect(countRows(server)).toBe(1);
    const own = await rider.sync(sent.entries, { account: rider.user.id });
    expect(own.results).toMatchObject([{ status: "stored" }]);
  });

  it("refuses an envelope that is too full or of the wrong shape, whole", async () => {
    const server = await startTestServer();
    const { rider, bikeId } = await riderWithBike(server);
    const entries = Array.from({ length: 501 }, () => hoursEntry(bikeId, 12));
    const wrong: [object, string][] = [
      [{ known: {}, entries }, "entries"],
      [{ known: {} }, "entries"],
      [{ known: { "not an id": 1 }, entries: [] }, "known.not an id"],
      [{ known: { [bikeId]: -1 }, entries: [] }, `known.${bikeId}`],
      [{ known: {}, entries: [], more: 1 }, "more"],
    ];
    for (const [body, field] of wrong) {
      const response = await rider.phone.post("/api/sync").send(body);
      expect(response.status).toBe(422);
      expect((response.body as { errors: object }).errors).toHaveProperty([field]);
    }
    expect(countRows(server)).toBe(1);
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
