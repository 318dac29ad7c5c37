import SQLite from "better-sqlite3";
import { subDays } from "date-fns";
import { copyFileSync, existsSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { assertIntegrity, backUpDatabase, backupsDir } from "../../server/db/back-up-database.ts";
import { databaseFile } from "../../server/db/open-database.ts";
import { restoreDatabase } from "../../server/services/restore-database.ts";
import { rebuildSummaries } from "../../server/services/summarise-bike.ts";
import { clubsResponseSchema } from "../../shared/schemas/club.ts";
import type { Reminders } from "../../shared/schemas/reminders.ts";
import { clubOfFour, giveRoles, invite, join, lineUp, share, withdraw } from "../helpers/club.ts";
import { mailedToken } from "../helpers/mailed-token.ts";
import { startMailServer } from "../helpers/mail-server.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  smallLog,
} from "../helpers/make-entry.ts";
import { createPhone, PASSWORD, signInRider, signUpRider, type Rider } from "../helpers/rider.ts";
import { startTestServer, temporaryDir, type TestServer } from "../helpers/start-test-server.ts";

async function backUp({ database, dataDir }: TestServer): Promise<string> {
  const file = path.join(backupsDir(dataDir), "kept.sqlite");
  await backUpDatabase(database.$client, file);
  return file;
}

/** Stops the server, restores the backup, and starts another over the same folder. */
async function restoreAndStart(
  server: TestServer,
  backup: string,
  config: { smtpUrl?: string } = {},
): Promise<TestServer> {
  await server.stop();
  await restoreDatabase(server.dataDir, backup);
  return startTestServer({ ...config, dataDir: server.dataDir });
}

describe("a restored server", () => {
  it("is healed by the phones: another epoch, and everything sent again is taken", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const bikeId = newId();
    const log = smallLog(bikeId);
    await rider.sync(log.slice(0, 3));
    const backup = await backUp(server);
    const { epoch, bikes } = await rider.sync(log.slice(3));
    const known = { [bikeId]: bikes[0]!.rev };
    const summary = await rider.summary(bikeId);

    const restored = await signInRider(await restoreAndStart(server, backup), rider.user.email);
    const first = await restored.sync([], { known, epoch });
    expect(first.epoch).not.toBe(epoch);
    expect(first.bikes[0]!.entries.map(({ id }) => id)).toEqual(
      log.slice(0, 3).map(({ id }) => id),
    );
    const { results } = await restored.sync(log, { epoch: first.epoch });
    expect(results.map(({ status }) => status)).toEqual([
      "duplicate",
      "duplicate",
      "duplicate",
      "stored",
      "stored",
    ]);
    expect(await restored.summary(bikeId)).toEqual(summary);
  });

  it("does not bring back what was erased since the backup", async () => {
    const server = await startTestServer();
    const [rider, leaver] = [await signUpRider(server), await signUpRider(server, "Bob")];
    const [bikeId, kept] = [newId(), newId()];
    const log = smallLog(bikeId);
    await rider.sync([...log, bikeEntry(kept)]);
    await leaver.sync(smallLog(newId()));
    const backup = await backUp(server);
    const late = noteEntry(bikeId);
    await rider.sync([late]);
    await rider.phone.delete(`/api/bikes/${bikeId}`).expect(204);
    await leaver.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);

    const restoredServer = await restoreAndStart(server, backup);
    const restored = await signInRider(restoredServer, rider.user.email);
    expect((await restored.sync([])).bikes.map((bike) => bike.bikeId)).toEqual([kept]);
    const { results } = await restored.sync([...log, late]);
    expect(new Set(results.map(({ reason }) => reason))).toEqual(new Set(["erased"]));
    expect(restoredServer.store.users.findByEmail(leaver.user.email)).toBeUndefined();
  });

  it("leaves without a name what an account wrote that was erased since the backup", async () => {
    const server = await startTestServer();
    const { mechanic, owner, bikeId } = await clubOfFour(server);
    const note = noteEntry(bikeId);
    await mechanic.sync([note]);
    const backup = await backUp(server);
    await mechanic.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    const restored = await signInRider(await restoreAndStart(server, backup), owner.user.email);
    const { bikes } = await restored.sync([]);
    expect(bikes[0]!.entries.find(({ id }) => id === note.id)?.author.name).toBe("Former member");
  });

  it("heeds every erasure that was confirmed, also after one that was cut short", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const bikeId = newId();
    await rider.sync(smallLog(bikeId));
    const backup = await backUp(server);
    writeFileSync(path.join(server.dataDir, "erased.jsonl"), '{"erasedAt":"2026-0', { flag: "a" });
    await rider.phone.delete(`/api/bikes/${bikeId}`).expect(204);
    const restored = await signInRider(await restoreAndStart(server, backup), rider.user.email);
    expect((await restored.sync([])).bikes).toEqual([]);
  });
});

describe("a restored club", () => {
  it("does not share again what was withdrawn, nor let in again who left, since the backup", async () => {
    const server = await startTestServer();
    const { organiser, mechanic, owner, member, club, bikeId } = await clubOfFour(server);
    const again = newId();
    await owner.sync(smallLog(again));
    await share(owner, again, club.id);
    await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    const backup = await backUp(server);
    await withdraw(owner, bikeId, club.id);
    const path = `/api/clubs/${club.id}/members/${member.user.id}`;
    await organiser.phone.delete(path).expect(204);

    const restored = await restoreAndStart(server, backup);
    const [mick, bob] = [
      await signInRider(restored, mechanic.user.email),
      await signInRider(restored, member.user.email),
    ];
    const { bikes } = await lineUp(mick, club.id);
    expect(bikes.map((bike) => bike.bikeId)).toEqual([again]);
    await bob.phone.get(`/api/clubs/${club.id}`).expect(404);
  });

  it("keeps what was shared again before the backup was made", async () => {
    const server = await startTestServer();
    const { mechanic, owner, club, bikeId } = await clubOfFour(server);
    await withdraw(owner, bikeId, club.id);
    await share(owner, bikeId, club.id);
    const restored = await restoreAndStart(server, await backUp(server));
    const mick = await signInRider(restored, mechanic.user.email);
    expect((await lineUp(mick, club.id)).bikes).toHaveLength(1);
  });

  it("does not open again a link that was revoked since the backup", async () => {
    const server = await startTestServer();
    const { organiser, member, club, invited } = await clubOfFour(server);
    const kept = await invite(organiser, club.id, { email: "friend@club.example" });
    const backup = await backUp(server);
    const path = `/api/clubs/${club.id}/invites/${invited.invite.id}`;
    await organiser.phone.delete(path).expect(204);
    await member.phone.delete(`/api/clubs/${club.id}/members/${member.user.id}`).expect(204);

    const restored = await restoreAndStart(server, backup);
    const bob = await signInRider(restored, member.user.email);
    await bob.phone.post(`/api/invites/${invited.token}/accept`).expect(404);
    await join(bob, kept.token);
  });

  it("does not open a link again to who was removed since the backup, used up though it was", async () => {
    const server = await startTestServer();
    const { organiser, club, invited } = await clubOfFour(server);
    const { token } = await invite(organiser, club.id);
    const backup = await backUp(server);
    const rex = await signUpRider(server, "Rex");
    await join(rex, token);
    await organiser.phone.delete(`/api/clubs/${club.id}/members/${rex.user.id}`).expect(204);

    const stranger = await signUpRider(await restoreAndStart(server, backup), "Una");
    for (const open of [token, invited.token])
      await stranger.phone.post(`/api/invites/${open}/accept`).expect(404);
  });

  const clubsOf = async ({ phone }: Rider) =>
    clubsResponseSchema.parse((await phone.get("/api/clubs").expect(200)).body).clubs;

  it("does not give back a role that was taken since the backup", async () => {
    const server = await startTestServer();
    const { organiser, mechanic, member, club } = await clubOfFour(server);
    await giveRoles(organiser, club.id, member, { organiser: true }).expect(200);
    const backup = await backUp(server);
    await giveRoles(organiser, club.id, mechanic, { mechanic: false }).expect(200);
    await giveRoles(organiser, club.id, member, { organiser: false }).expect(200);

    const restored = await restoreAndStart(server, backup);
    for (const { user } of [mechanic, member]) {
      const rider = await signInRider(restored, user.email);
      expect(await clubsOf(rider)).toMatchObject([{ organiser: false, mechanic: false }]);
    }
  });

  it("keeps a role that was given again before the backup was made", async () => {
    const server = await startTestServer();
    const { organiser, mechanic, club } = await clubOfFour(server);
    await giveRoles(organiser, club.id, mechanic, { mechanic: false }).expect(200);
    await giveRoles(organiser, club.id, mechanic, { mechanic: true }).expect(200);
    const restored = await restoreAndStart(server, await backUp(server));
    const mick = await signInRider(restored, mechanic.user.email);
    expect(await clubsOf(mick)).toMatchObject([{ organiser: false, mechanic: true }]);
  });

  it("keeps the organiser to whom it had come before the backup was made", async () => {
    const server = await startTestServer();
    const { organiser, mechanic, member, club } = await clubOfFour(server);
    await giveRoles(organiser, club.id, mechanic, { organiser: false }).expect(200);
    await organiser.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    await giveRoles(mechanic, club.id, member, { organiser: true }).expect(200);
    const restored = await restoreAndStart(server, await backUp(server));
    const mick = await signInRider(restored, mechanic.user.email);
    expect(await clubsOf(mick)).toMatchObject([{ organiser: true, mechanic: true }]);
  });

  it("comes to its mechanic where its organisers since the backup are not in it", async () => {
    const server = await startTestServer();
    const { organiser, mechanic, owner, club, invited } = await clubOfFour(server);
    const backup = await backUp(server);
    const rex = await signUpRider(server, "Rex");
    await join(rex, invited.token);
    await giveRoles(organiser, club.id, rex, { organiser: true }).expect(200);
    await giveRoles(rex, club.id, organiser, { organiser: false }).expect(200);

    const restored = await restoreAndStart(server, backup);
    const organises = async ({ user }: Rider) =>
      (await clubsOf(await signInRider(restored, user.email)))[0]!.organiser;
    expect(await organises(organiser)).toBe(false);
    expect(await organises(mechanic)).toBe(true);
    expect(await organises(owner)).toBe(false);
  });

  it("that was closed since the backup is closed", async () => {
    const server = await startTestServer();
    const { organiser, owner, club } = await clubOfFour(server);
    const backup = await backUp(server);
    await organiser.phone.delete(`/api/clubs/${club.id}`).expect(204);
    const restored = await restoreAndStart(server, backup);
    const ann = await signInRider(restored, owner.user.email);
    await ann.phone.get("/api/clubs").expect(200, { clubs: [] });
  });
});

describe("sessions after a restore", () => {
  const statusOf = async (server: TestServer, { cookie }: { cookie: string }) =>
    (await createPhone(server).get("/api/auth/me").set("Cookie", cookie)).status;

  it("stay as they were before it, those begun since the backup too, and none that ended is back", async () => {
    const server = await startTestServer();
    const first = await signUpRider(server);
    const { email } = first.user;
    const [left, lost] = [await signInRider(server, email), await signInRider(server, email)];
    const gone = await signUpRider(server, "Bob");
    const backup = await backUp(server);
    await left.phone.post("/api/auth/sign-out").expect(204);
    const devices = (await lost.phone.get("/api/account/devices")).body as {
      devices: { id: string; current: boolean }[];
    };
    const { id } = devices.devices.find(({ current }) => current)!;
    await first.phone.delete(`/api/account/devices/${id}`).expect(204);
    await gone.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    const since = await signInRider(server, email);
    const stranger = await signUpRider(server, "Una");

    const restored = await restoreAndStart(server, backup);
    expect(await statusOf(restored, first)).toBe(200);
    expect(await statusOf(restored, since)).toBe(200);
    for (const ended of [left, lost, gone, stranger])
      expect(await statusOf(restored, ended)).toBe(401);
  });

  it("are none that an old password had begun", async () => {
    const server = await startTestServer();
    const [rider, { email }] = await signUpRider(server).then((one) => [one, one.user] as const);
    const thief = await signInRider(server, email);
    const backup = await backUp(server);
    const change = { password: PASSWORD, newPassword: "nine valves and a spare" };
    await rider.phone.post("/api/account/password").send(change).expect(204);
    const restored = await restoreAndStart(server, backup);
    expect(await statusOf(restored, thief)).toBe(401);
    expect(await statusOf(restored, rider)).toBe(401);
  });

  it.each(["damaged", "damaged in part", "gone"])(
    "are none where the database that was there is %s",
    async (how) => {
      const server = await startTestServer();
      const rider = await signUpRider(server);
      const backup = await backUp(server);
      await server.stop();
      const file = databaseFile(server.dataDir);
      if (how === "gone") rmSync(file);
      else if (how === "damaged in part")
        writeFileSync(file, readFileSync(file).fill(7, 4096, 3 * 4096));
      else writeFileSync(file, "no database any more, whatever it was before");
      expect(await restoreDatabase(server.dataDir, backup)).toMatchObject({ signedOut: true });
      const restored = await startTestServer({ dataDir: server.dataDir });
      expect(await statusOf(restored, rider)).toBe(401);
      await signInRider(restored, rider.user.email);
    },
  );
});

describe("a link mailed before a restore", () => {
  it("is void, that by which a password or an address was changed since the backup too", async () => {
    const server = await startTestServer();
    const [ann, bob] = [await signUpRider(server), await signUpRider(server, "Bob")];
    const [{ email }, phone] = [ann.user, createPhone(server)];
    await phone.post("/api/auth/request-password-reset").send({ email }).expect(204);
    const used = await mailedToken(server, "Choose a new password");
    const asked = { email: "thief@club.example", password: PASSWORD };
    await bob.phone.post("/api/account/email").send(asked).expect(204);
    const voided = await mailedToken(server, "Confirm your new e-mail address");
    const backup = await backUp(server);
    const reset = { token: used, password: "nine valves and a spare" };
    await phone.post("/api/auth/reset-password").send(reset).expect(204);
    const change = { password: PASSWORD, newPassword: "nine valves and a spare" };
    await bob.phone.post("/api/account/password").send(change).expect(204);

    const stranger = createPhone(await restoreAndStart(server, backup));
    await stranger.post("/api/auth/reset-password").send(reset).expect(422);
    await stranger.post("/api/auth/verify-email").send({ token: voided }).expect(422);
  });
});

describe("mails after a restore", () => {
  it("are those that each account wants now", async () => {
    const server = await startTestServer();
    const [ann, bob] = [await signUpRider(server), await signUpRider(server, "Bob")];
    const wants = ({ phone }: Rider, reminders: Reminders) =>
      phone.put("/api/account/reminders").send(reminders).expect(200);
    await wants(bob, { dueMails: false, stopMails: false });
    const backup = await backUp(server);
    await wants(ann, { dueMails: false, stopMails: true });
    await wants(bob, { dueMails: true, stopMails: false });
    await wants(await signUpRider(server, "Una"), { dueMails: false, stopMails: false });

    const restored = await restoreAndStart(server, backup);
    const wanted = async ({ user }: Rider) => {
      const { phone } = await signInRider(restored, user.email);
      return (await phone.get("/api/account/reminders")).body as unknown;
    };
    expect(await wanted(ann)).toEqual({ reminders: { dueMails: false, stopMails: true } });
    expect(await wanted(bob)).toEqual({ reminders: { dueMails: true, stopMails: false } });
  });

  it("are none that waited and lead nowhere any more, and one about a bike once it is there", async () => {
    const mail = await startMailServer();
    const { smtpUrl } = mail;
    const server = await startTestServer({ smtpUrl });
    const { organiser, owner, mechanic, club, bikeId } = await clubOfFour(server);
    for (const { user } of [organiser, owner]) server.store.users.markVerified(user.id);
    const backup = await backUp(server);
    await server.mailer.sendDue();
    const before = mail.letters.length;
    mail.state.busy = true;
    const added = newId();
    const log = [bikeEntry(added, { name: "Fern" }), noteEntry(added, "Hose is cracked", "stop")];
    await owner.sync([log[0]!]);
    await share(owner, added, club.id);
    await mechanic.sync([log[1]!, noteEntry(bikeId, "Screen is blocked", "stop")]);
    await invite(organiser, club.id, { email: "friend@club.example" });
    const { email } = owner.user;
    await createPhone(server).post("/api/auth/request-password-reset").send({ email }).expect(204);
    await server.mailer.sendDue();
    const waiting = "SELECT count(*) FROM mails WHERE letter IS NOT NULL";
    expect(server.database.$client.prepare(waiting).pluck().get()).toBe(4);

    const restored = await restoreAndStart(server, backup, { smtpUrl });
    mail.state.busy = false;
    restored.database.$client.exec("UPDATE mails SET next_attempt_at = 0 WHERE letter IS NOT NULL");
    await restored.mailer.sendDue();
    const sent = () => mail.letters.slice(before).map(({ headers }) => headers.subject);
    expect(sent()).toEqual(["Moss: stop advised"]);
    const ann = await signInRider(restored, email);
    await ann.sync([log[0]!]);
    await share(ann, added, club.id);
    await (await signInRider(restored, mechanic.user.email)).sync([log[1]!]);
    await restored.mailer.sendDue();
    expect(sent()).toEqual(["Moss: stop advised", "Fern: stop advised"]);
  });

  const daysAgo = (days: number) => subDays(new Date(), days).toISOString();

  it("are none that were sent since the backup, be it of a bike that the backup lacks", async () => {
    const mail = await startMailServer();
    const { smtpUrl } = mail;
    const server = await startTestServer({ smtpUrl });
    const { owner, mechanic, bikeId } = await clubOfFour(server);
    server.store.users.markVerified(owner.user.id);
    const backup = await backUp(server);
    const added = newId();
    const log = [
      bikeEntry(added, { name: "Fern" }),
      checkEntry(added, 12, 3, daysAgo(40)),
      hoursEntry(added, 40, daysAgo(1)),
    ];
    const stop = { ...noteEntry(bikeId, "Hose is cracked", "stop"), at: daysAgo(0) };
    await owner.sync(log);
    await mechanic.sync([stop]);
    await server.services.mailAllDue();
    await server.mailer.sendDue();
    const sent = () => mail.letters.map(({ headers }) => headers.subject).sort();
    const before = sent();
    expect(before).toEqual(
      expect.arrayContaining(["Fern: delivery check overdue", "Moss: stop advised"]),
    );

    const restored = await restoreAndStart(server, backup, { smtpUrl });
    await (await signInRider(restored, owner.user.email)).sync(log);
    await (await signInRider(restored, mechanic.user.email)).sync([stop]);
    await restored.services.mailAllDue();
    await restored.mailer.sendDue();
    expect(sent()).toEqual(before);
    const again = { ...stop, id: newId() };
    await (await signInRider(restored, mechanic.user.email)).sync([again]);
    await restored.mailer.sendDue();
    expect(sent()).toHaveLength(before.length + 1);
  });
});

describe("restoring", () => {
  it("keeps the database that was there", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const backup = await backUp(server);
    await rider.sync(smallLog(newId()));
    await server.stop();
    const { setAside } = await restoreDatabase(server.dataDir, backup);
    assertIntegrity(setAside!);
    const undone = await restoreAndStart(server, setAside!);
    const again = await signInRider(undone, rider.user.email);
    expect((await again.sync([])).bikes[0]!.entries).toHaveLength(5);
  });

  it("is refused while the server runs", async () => {
    const server = await startTestServer();
    const backup = await backUp(server);
    const restoring = restoreDatabase(server.dataDir, backup);
    await expect(restoring).rejects.toThrow("stop the server first");
    await signUpRider(server);
  }, 15_000);

  it("lets no server go on that has opened the database before", async () => {
    const server = await startTestServer();
    const backup = await backUp(server);
    await server.stop();
    const waiting = new SQLite(databaseFile(server.dataDir));
    await restoreDatabase(server.dataDir, backup);
    expect(() => waiting.pragma("journal_mode=WAL")).toThrow("readonly");
    waiting.close();
  });

  it("takes a backup with the WAL that was copied along", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const file = databaseFile(server.dataDir);
    const copy = path.join(temporaryDir(), "copied.sqlite");
    for (const part of ["", "-wal"]) copyFileSync(file + part, copy + part);
    await signInRider(await restoreAndStart(server, copy), rider.user.email);
  });

  it("is refused from the database itself", async () => {
    const server = await startTestServer();
    await server.stop();
    const restoring = restoreDatabase(server.dataDir, databaseFile(server.dataDir));
    await expect(restoring).rejects.toThrow("is the database itself");
  });

  it.each(["empty", "another program's"])("is refused from a file that is %s", async (whose) => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const file = path.join(temporaryDir(), "other.sqlite");
    writeFileSync(file, "");
    if (whose !== "empty") {
      const other = new SQLite(file);
      other.exec("CREATE TABLE users (id TEXT); INSERT INTO users VALUES ('a')");
      other.close();
    }
    await server.stop();
    await expect(restoreDatabase(server.dataDir, file)).rejects.toThrow("is no backup of Sumpless");
    await signInRider(await startTestServer({ dataDir: server.dataDir }), rider.user.email);
  });

  it("is refused from a damaged backup, and possible over a damaged database", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const backup = await backUp(server);
    const damaged = path.join(temporaryDir(), "damaged.sqlite");
    writeFileSync(damaged, "not a database, but long enough to be looked at as one");
    await server.stop();
    await expect(restoreDatabase(server.dataDir, damaged)).rejects.toThrow();
    expect(existsSync(databaseFile(server.dataDir))).toBe(true);
    writeFileSync(databaseFile(server.dataDir), "no database any more, whatever it was before");
    await signInRider(await restoreAndStart(server, backup), rider.user.email);
  });
});

it("making all summaries anew finds what the entries say", async () => {
  const server = await startTestServer();
  const rider = await signUpRider(server);
  const bikeId = newId();
  await rider.sync([...smallLog(bikeId), hoursEntry(bikeId, 34, "2026-04-12T09:00:00.000Z")]);
  const summary = await rider.summary(bikeId);
  server.database.$client.exec(`UPDATE bike_summaries SET summary = '{}', verdict = 'none'`);
  expect(rebuildSummaries(server.store)).toBe(1);
  expect(await rider.summary(bikeId)).toEqual(summary);
  const columns = server.database.$client
    .prepare("SELECT name, verdict, action, p_low, hours_now, due_in_hours FROM bike_summaries")
    .get();
  expect(columns).toEqual({
    name: "Moss",
    verdict: "low",
    action: "stop",
    p_low: summary.pLow,
    hours_now: 34,
    due_in_hours: -2,
  });
});
