/**
 * The server killed (`kill -9`) under load, anywhere and at the worst moments: nothing that it
 * acknowledged is lost, nothing doubled, the file sound. `KILLS` makes it longer.
 */
import SQLite from "better-sqlite3";
import fc from "fast-check";
import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { cpSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { createInterface } from "node:readline";
import { setTimeout as sleep } from "node:timers/promises";
import { expect, it, onTestFinished } from "vitest";
import { assertIntegrity, backUpDatabase, backupsDir } from "../../server/db/back-up-database.ts";
import { migrateDatabase, migrationsFolder } from "../../server/db/migrate-database.ts";
import { databaseFile, openDatabase } from "../../server/db/open-database.ts";
import { syncResponseSchema } from "../../shared/schemas/sync.ts";
import { bikeEntry, newId, noteEntry } from "../helpers/make-entry.ts";
import { PASSWORD } from "../helpers/rider.ts";
import { temporaryDir } from "../helpers/start-test-server.ts";

const KILLS = Number(process.env.KILLS ?? 5);
const moments = ["anywhere", "before-commit", "after-commit", "checkpoint", "backup"] as const;
type Moment = (typeof moments)[number] | "none";

const ORIGIN = "http://localhost:0";

interface Held {
  process: ChildProcess;
  url: string;
  /** Resolves when the process stands still where it was told to. */
  held: Promise<void>;
}

function spawnHeld(program: string[], dataDir: string, holdAt: string): ChildProcess {
  const args = ["--import", "tsx", "tests/helpers/held-program.ts", ...program];
  const env = { ...process.env, PORT: "0", DATA_DIR: dataDir, LOG_LEVEL: "info", HOLD_AT: holdAt };
  const child = spawn(process.execPath, args, { env, stdio: ["ignore", "pipe", "ignore"] });
  onTestFinished(() => void child.kill("SIGKILL"));
  return child;
}

/** Resolves with the first line that `read` makes something of. */
function lineOf<T>(child: ChildProcess, read: (line: string) => T | undefined): Promise<T> {
  return new Promise((resolve) => {
    createInterface(child.stdout!).on("line", (line) => {
      const found = read(line);
      if (found !== undefined) resolve(found);
    });
  });
}

const readHeld = (line: string) => (line === "HELD" ? true : undefined);

function readPort(line: string): number | undefined {
  if (!line.startsWith("{")) return undefined;
  const { msg, port } = JSON.parse(line) as { msg: string; port?: number };
  return msg === "listening" ? port : undefined;
}

async function startServer(dataDir: string, holdAt: string): Promise<Held> {
  const child = spawnHeld(["server/index.ts"], dataDir, holdAt);
  const held = lineOf(child, readHeld).then(() => undefined);
  const port = await lineOf(child, readPort);
  return { process: child, url: `http://127.0.0.1:${port}`, held };
}

async function kill(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const exited = once(child, "exit");
  child.kill("SIGKILL");
  await exited;
}

/** A phone that writes and sends, and knows what the server acknowledged. */
function createWriter() {
  const bikeId = newId();
  const unsent = new Map([bikeEntry(bikeId)].map((entry) => [entry.id, entry as object]));
  const acknowledged = new Set<string>();
  let cookie = "";

  const post = (url: string, pathname: string, body: object) =>
    fetch(url + pathname, {
      method: "POST",
      headers: { origin: ORIGIN, cookie, "content-type": "application/json" },
      body: JSON.stringify(body),
    });

  async function enter(url: string, way: "sign-up" | "sign-in"): Promise<void> {
    const account = { email: "ann@club.example", password: PASSWORD };
    const answer = await post(url, `/api/auth/${way}`, {
      ...account,
      ...(way === "sign-up" && { name: "Ann" }),
    });
    expect(answer.ok).toBe(true);
    cookie = answer.headers.get("set-cookie")!.split(";")[0]!;
  }

  async function send(url: string): Promise<void> {
    const answer = await post(url, "/api/sync", { known: {}, entries: [...unsent.values()] });
    const { results } = syncResponseSchema.parse(await answer.json());
    for (const { id, status } of results) {
      expect(["stored", "duplicate"]).toContain(status);
      acknowledged.add(id!);
      unsent.delete(id!);
    }
  }

  /** Writes and sends until the server is gone. */
  async function load(url: string): Promise<void> {
    try {
      for (;;) {
        const notes = Array.from({ length: 3 }, () => noteEntry(bikeId));
        for (const note of notes) unsent.set(note.id, note);
        await send(url);
      }
    } catch (error) {
      if (!(error instanceof TypeError)) throw error;
    }
  }

  return { enter, send, load, acknowledged, unsent };
}

type Writer = ReturnType<typeof createWriter>;

function assertNothingLost(dataDir: string, { acknowledged }: Writer): void {
  const { $client } = openDatabase(databaseFile(dataDir));
  expect($client.pragma("integrity_check", { simple: true })).toBe("ok");
  expect($client.pragma("foreign_key_check")).toEqual([]);
  const stored = $client.prepare<[], string>("SELECT id FROM entries").pluck().all();
  $client.close();
  expect(new Set(stored).size).toBe(stored.length);
  expect([...acknowledged].filter((id) => !stored.includes(id))).toEqual([]);
}

async function killAt(moment: Moment, dataDir: string, writer: Writer, delayMs: number) {
  const server = await startServer(dataDir, moment);
  const load = writer.load(server.url);
  if (moment === "before-commit" || moment === "after-commit") await server.held;
  else if (moment === "backup") {
    const backup = spawnHeld(["server/backup.ts"], dataDir, "backup");
    await lineOf(backup, readHeld);
    await sleep(delayMs);
    await kill(backup);
  } else await sleep(delayMs);
  await kill(server.process);
  await load;
  assertNothingLost(dataDir, writer);
}

it(
  `loses and doubles nothing when it is killed ${KILLS} times`,
  { timeout: 3_600_000 },
  async () => {
    const dataDir = temporaryDir();
    const writer = createWriter();
    const first = await startServer(dataDir, "none");
    await writer.enter(first.url, "sign-up");
    await writer.send(first.url);
    await kill(first.process);

    const delays = fc.sample(fc.integer({ min: 1, max: 300 }), { numRuns: KILLS, seed: 9 });
    for (const [index, delayMs] of delays.entries())
      await killAt(moments[index % moments.length]!, dataDir, writer, delayMs);

    const last = await startServer(dataDir, "none");
    await writer.send(last.url);
    await kill(last.process);
    expect(writer.unsent.size).toBe(0);
    assertNothingLost(dataDir, writer);
    for (const name of readdirSync(backupsDir(dataDir)).filter((file) => file.endsWith(".sqlite")))
      assertIntegrity(path.join(backupsDir(dataDir), name));
  },
);

/** The database as the very first version of the server left it, with an account in it. */
async function firstVersion(dataDir: string): Promise<void> {
  const folder = path.join(temporaryDir(), "drizzle");
  cpSync(migrationsFolder, folder, { recursive: true });
  const journal = path.join(folder, "meta/_journal.json");
  const { entries, ...rest } = JSON.parse(readFileSync(journal, "utf8")) as { entries: object[] };
  writeFileSync(journal, JSON.stringify({ ...rest, entries: entries.slice(0, 1) }));
  const database = openDatabase(databaseFile(dataDir));
  await migrateDatabase(database, backupsDir(dataDir), folder);
  database.$client.exec(
    `INSERT INTO users (id, email, name, password_hash, verified, created_at)
     VALUES ('a', 'old@club.example', 'Old', '', 0, '2026-01-01T00:00:00Z')`,
  );
  database.$client.close();
}

it.each(["before-commit", "after-commit", "backup"])(
  "keeps every row when it is killed while migrating: %s",
  { timeout: 60_000 },
  async (holdAt) => {
    const dataDir = temporaryDir();
    await firstVersion(dataDir);
    const migrating = spawnHeld(["server/index.ts"], dataDir, holdAt);
    await lineOf(migrating, readHeld);
    await kill(migrating);

    const again = await startServer(dataDir, "none");
    await createWriter().enter(again.url, "sign-up");
    await kill(again.process);
    const client = new SQLite(databaseFile(dataDir));
    expect(client.pragma("integrity_check", { simple: true })).toBe("ok");
    expect(client.prepare("SELECT email FROM users ORDER BY email").pluck().all()).toEqual([
      "ann@club.example",
      "old@club.example",
    ]);
    client.close();
  },
);

async function backUp(dataDir: string): Promise<string> {
  const file = path.join(temporaryDir(), "kept.sqlite");
  const { $client } = openDatabase(databaseFile(dataDir));
  await backUpDatabase($client, file);
  $client.close();
  return file;
}

it("starts no server while a restore runs", { timeout: 60_000 }, async () => {
  const dataDir = temporaryDir();
  const writer = createWriter();
  const server = await startServer(dataDir, "none");
  await writer.enter(server.url, "sign-up");
  await kill(server.process);

  const restoring = spawnHeld(
    ["server/restore.ts", await backUp(dataDir)],
    dataDir,
    "before-commit",
  );
  await lineOf(restoring, readHeld);
  const meanwhile = spawnHeld(["server/index.ts"], dataDir, "none");
  const started = lineOf(meanwhile, readPort);
  expect(await Promise.race([started, once(meanwhile, "exit")])).toEqual([1, null]);
  await kill(restoring);
  const again = await startServer(dataDir, "none");
  await writer.enter(again.url, "sign-in");
  await kill(again.process);
});

it.each(["before-commit", "after-commit"])(
  "leaves the database as it was when a restore is killed: %s",
  { timeout: 60_000 },
  async (holdAt) => {
    const dataDir = temporaryDir();
    const writer = createWriter();
    const server = await startServer(dataDir, "none");
    const empty = await backUp(dataDir);
    await writer.enter(server.url, "sign-up");
    await writer.send(server.url);
    await kill(server.process);

    const restoring = spawnHeld(["server/restore.ts", empty], dataDir, holdAt);
    await lineOf(restoring, readHeld);
    await kill(restoring);
    const again = await startServer(dataDir, "none");
    await writer.enter(again.url, "sign-in");
    await kill(again.process);
    assertNothingLost(dataDir, writer);
  },
);
