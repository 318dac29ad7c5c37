import { describe, expect, it } from "vitest";
import { MAX_ENTRIES_PER_BIKE } from "../../shared/schemas/entry.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  strikeEntry,
} from "../helpers/make-entry.ts";
import { riderWithBike, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const refusal = (id: string | null, reason: string, errors?: object) => ({
  index: 0,
  id,
  status: "refused",
  reason,
  ...(errors && { errors }),
});

describe("the server refuses", () => {
  it("what is no entry, without an id", async () => {
    const { rider } = await riderWithBike(await startTestServer());
    for (const nothing of [7, null, "entry", [], {}, { kind: "hours" }, { id: 5 }]) {
      const { results } = await rider.sync([nothing]);
      expect(results).toMatchObject([refusal(null, "invalid", {})]);
    }
  });

  it("an entry that is wrong, and says in a sentence by field why", async () => {
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

  it("kinds and versions that only a newer app knows", async () => {
    const { rider, bikeId } = await riderWithBike(await startTestServer());
    const entry = hoursEntry(bikeId, 12);
    for (const newer of [
      { ...entry, kind: "photo", body: { file: "x" } },
      { ...entry, v: 2, body: { more: 1 } },
    ])
      expect((await rider.sync([newer])).results).toEqual([refusal(entry.id, "unknown-kind")]);
    expect((await rider.sync([entry])).results).toMatchObject([{ status: "stored" }]);
  });

  it("an id that holds something else, and overwrites nothing", async () => {
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

  it("in the same words a bike that is another's and one that is not", async () => {
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

  it("what is not writable only until its bike is there", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const entry = hoursEntry(bikeId, 12);
    expect((await rider.sync([entry])).results).toEqual([refusal(entry.id, "not-writable")]);
    const { results } = await rider.sync([entry, bikeEntry(bikeId)]);
    expect(results.map(({ status }) => status)).toEqual(["stored", "stored"]);
  });

  it("to strike a bike's details or a strike", async () => {
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

  it("an entry of a bike whose log is full", async () => {
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

  it("everything from a phone that believes another account is signed in", async () => {
    const server = await startTestServer();
    const { rider, bikeId } = await riderWithBike(server);
    const sent = { account: newId(), known: {}, entries: [hoursEntry(bikeId, 12)] };
    const response = await rider.phone.post("/api/sync").send(sent);
    expect(response.status).toBe(409);
    expect(server.store.entries.countOf(bikeId)).toBe(1);
    const own = await rider.sync(sent.entries, { account: rider.user.id });
    expect(own.results).toMatchObject([{ status: "stored" }]);
  });

  it("an envelope that is too full or of the wrong shape, whole", async () => {
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
    expect(server.store.entries.countOf(bikeId)).toBe(1);
  });
});
