import SQLite from "better-sqlite3";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { assertPragmas, databaseFile, openDatabase } from "../../server/db/open-database.ts";
import { newId, noteEntry, smallLog } from "../helpers/make-entry.ts";
import { signUpRider } from "../helpers/rider.ts";
import { startTestServer, temporaryDir } from "../helpers/start-test-server.ts";

describe("every connection", () => {
  it("writes ahead, syncs fully, holds to references and waits for others", () => {
    const file = databaseFile(temporaryDir());
    for (const time of ["first", "again"]) {
      const { $client } = openDatabase(file);
      const answers = ["journal_mode", "synchronous", "foreign_keys", "busy_timeout"].map(
        (pragma) => $client.pragma(pragma, { simple: true }),
      );
      expect(answers, time).toEqual(["wal", 2, 1, 5_000]);
      $client.close();
    }
  });

  it("that is not set so is refused", () => {
    const file = path.join(temporaryDir(), "plain.sqlite");
    const first = new SQLite(file);
    expect(() => assertPragmas(first)).toThrow("SQLite runs with journal_mode=delete.");
    first.pragma("journal_mode=WAL");
    first.close();
    const again = new SQLite(file);
    expect(() => assertPragmas(again)).toThrow("SQLite runs with synchronous=1.");
    again.close();
  });
});

describe("a server that cannot store", () => {
  it("answers 503 when the disk is full, with nothing half-written", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    const [bikeId, next] = [newId(), newId()];
    await rider.sync(smallLog(bikeId));
    const { $client } = server.database;
    const pages = Number($client.pragma("page_count", { simple: true }));
    $client.pragma(`max_page_count=${pages}`);

    const sent = smallLog(next).concat(
      Array.from({ length: 400 }, () => noteEntry(next, "x".repeat(2_000))),
    );
    const full = await rider.phone.post("/api/sync").send({ known: {}, entries: sent });
    expect(full.status).toBe(503);
    expect(full.type).toBe("application/problem+json");
    expect(Number(full.headers["retry-after"])).toBeGreaterThan(0);
    await rider.phone.get(`/api/bikes/${next}`).expect(404);
    expect((await rider.sync([])).bikes.map((bike) => bike.bikeId)).toEqual([bikeId]);

    $client.pragma("max_page_count=1000000");
    const { results } = await rider.sync(sent);
    expect(results.every(({ status }) => status === "stored")).toBe(true);
  });

  it("answers 503 while another process holds the database", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    server.database.$client.pragma("busy_timeout=1");
    const other = openDatabase(databaseFile(server.dataDir));
    other.$client.exec("BEGIN IMMEDIATE");
    const sent = { known: {}, entries: smallLog(newId()) };
    const busy = await rider.phone.post("/api/sync").send(sent);
    expect([busy.status, busy.headers["retry-after"]]).toEqual([503, "5"]);
    other.$client.exec("ROLLBACK");
    other.$client.close();
    expect((await rider.sync(sent.entries)).results).toMatchObject([
      { status: "stored" },
      { status: "stored" },
      { status: "stored" },
      { status: "stored" },
      { status: "stored" },
    ]);
  });

  it("answers 500 without a word of its inside when something breaks", async () => {
    const server = await startTestServer();
    const rider = await signUpRider(server);
    server.database.$client.exec("ALTER TABLE bikes RENAME TO bicycles");
    const broken = await rider.phone.get("/api/bikes");
    expect(broken.status).toBe(500);
    expect(broken.type).toBe("application/problem+json");
    expect(broken.text).not.toMatch(/SQL|bikes|\.ts|\.js/);
  });
});
