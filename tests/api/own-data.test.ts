import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { clubOfFour } from "../helpers/club.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  smallLog,
  strikeEntry,
} from "../helpers/make-entry.ts";
import { createPhone, PASSWORD, signInRider, signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

describe("erasing a bike", () => {
  it("takes its log out of the database, and the other bikes stay", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const [bikeId, other] = [newId(), newId()];
    const { bikes } = await rider.sync([...smallLog(bikeId), bikeEntry(other)]);
    const known = Object.fromEntries(bikes.map((bike) => [bike.bikeId, bike.rev]));
    await rider.phone.delete(`/api/bikes/${bikeId}`).expect(204);
    await rider.phone.get(`/api/bikes/${bikeId}`).expect(404);
    await rider.phone.delete(`/api/bikes/${bikeId}`).expect(404);
    expect(await rider.sync([], { known })).toMatchObject({ bikes: [], gone: [bikeId] });
    expect((await rider.summary(other)).name).toBe("Moss");
    expect((await rider.sync([])).bikes.map((bike) => bike.bikeId)).toEqual([other]);
  });

  it("lets no phone bring it, or any entry of it, back", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const [bikeId, other] = [newId(), newId()];
    const log = smallLog(bikeId);
    await rider.sync([...log, bikeEntry(other)]);
    await rider.phone.delete(`/api/bikes/${bikeId}`).expect(204);

    const moved = { ...noteEntry(other), id: log[2]!.id };
    const { results } = await rider.sync([...log, hoursEntry(bikeId, 50), moved]);
    expect(results.map(({ reason }) => reason)).toEqual(Array.from({ length: 7 }, () => "erased"));
  });

  it("is written down outside the database", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const bikeId = newId();
    const log = smallLog(bikeId);
    await rider.sync(log);
    await rider.phone.delete(`/api/bikes/${bikeId}`).expect(204);
    const [line] = readFileSync(path.join(server.dataDir, "erased.jsonl"), "utf8")
      .trim()
      .split("\n");
    expect(JSON.parse(line!)).toMatchObject({
      bikeIds: [bikeId],
      entryIds: log.map(({ id }) => id),
    });
  });
});

describe("one's own data", () => {
  it("can be taken along as a file", async () => {
    const rider = await signUpRider(await startTestServer());
    const log = smallLog(newId());
    const { bikes } = await rider.sync(log);
    const response = await rider.phone.get("/api/export").expect(200);
    expect(response.headers["content-disposition"]).toContain("attachment");
    expect(response.body).toMatchObject({
      user: rider.user,
      bikes: bikes.map(({ bikeId, entries }) => ({ bikeId, entries })),
    });
  });

  it("names the devices, and what was written of other people's bikes", async () => {
    const server = await startTestServer();
    const { mechanic, bikeId } = await clubOfFour(server);
    const note = noteEntry(bikeId);
    await mechanic.sync([note]);
    const response = await mechanic.phone.get("/api/export").expect(200);
    expect(response.body).toMatchObject({
      user: mechanic.user,
      devices: [{ name: "Unknown browser" }],
      clubs: [{ name: "Moor Riders", mechanic: true }],
      bikes: [],
      writtenElsewhere: [{ id: note.id, bikeId }],
    });
  });

  it("holds every check as a line for a spreadsheet, which runs none of it", async () => {
    const rider = await signUpRider(await startTestServer());
    const bikeId = newId();
    const [registered, ...log] = smallLog(bikeId);
    const formula = '=HYPERLINK("http://elsewhere.example")';
    const named = { ...registered!, body: { name: "-Moss, the first" } };
    const cold = checkEntry(bikeId, 34, 3, "2026-05-01T09:00:00.000Z");
    const noted = { ...cold, body: { ...cold.body, oilTempC: -5, note: formula } };
    await rider.sync([named, ...log, noted, strikeEntry(bikeId, noted.id)]);
    const response = await rider.phone.get("/api/export/checks.csv").expect(200);
    expect(response.headers["content-type"]).toBe("text/csv; charset=utf-8");
    expect(response.headers["content-disposition"]).toContain("attachment");
    const [header, ...lines] = response.text.replace("\uFEFF", "").trim().split("\r\n");
    expect(header).toContain('Bike,Checked at,"Meter, h",Engine hours,"Delivery, mL a run"');
    const name = '"\'-Moss, the first"';
    expect(lines).toHaveLength(3);
    expect(lines[0]).toMatch(new RegExp(`^${name},2026-03-02T09:00:00.000Z,12,12,2.9892,0.1017,`));
    expect(lines[1]).toContain(",low,stop,");
    expect(lines[2]).toContain(",struck,0 to 3,5 mL,0.2,-5,,yes,Ann,");
    expect(lines[2]).toContain(`"'=HYPERLINK(""http://elsewhere.example"")"`);
  });

  it("is erased with the account, for whoever knows its password", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const other = await signInRider(server, rider.user.email);
    const bystander = await signUpRider(server, "Bob");
    const log = smallLog(newId());
    await rider.sync(log);

    const wrong = await rider.phone.delete("/api/account").send({ password: "not mine" });
    expect(wrong.status).toBe(422);
    expect(wrong.body).toHaveProperty("errors.password");
    await rider.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);

    await other.phone.get("/api/auth/me").expect(401);
    const credentials = { email: rider.user.email, password: PASSWORD };
    await createPhone(server).post("/api/auth/sign-in").send(credentials).expect(401);
    const kept = ["users", "bikes", "entries", "bike_summaries", "sessions", "mailed_tokens"].map(
      (table) => server.database.$client.prepare(`SELECT count(*) FROM ${table}`).pluck().get(),
    );
    expect(kept).toEqual([1, 0, 0, 0, 1, 1]);
    const { results } = await bystander.sync(log);
    expect(new Set(results.map(({ reason }) => reason))).toEqual(new Set(["erased"]));
  });

  it("leaves what was written of other people's bikes, without the name", async () => {
    const server = await startTestServer();
    const { mechanic, owner, bikeId } = await clubOfFour(server);
    const note = noteEntry(bikeId);
    await mechanic.sync([note]);
    await mechanic.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    const { bikes } = await owner.sync([]);
    const kept = bikes[0]!.entries.find(({ id }) => id === note.id)!;
    expect(kept.author.name).toBe("Former member");
    const everything = JSON.stringify(
      server.database.$client.prepare("SELECT * FROM users, mails").all(),
    );
    expect(everything).not.toContain(mechanic.user.email);
    expect(everything).not.toContain("Mick");
  });
});
