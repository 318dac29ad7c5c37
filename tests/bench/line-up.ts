/**
 * `npm run bench`: how long the Line-up of 1,000 shared bikes takes in a database of 10,000, with a
 * short and a long log behind each bike. Figures are medians on this machine; nothing is asserted.
 */
import { subDays } from "date-fns";
import { once } from "node:events";
import { mkdtempSync, rmSync } from "node:fs";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { createApp } from "../../server/app.ts";
import { readConfig } from "../../server/config.ts";
import { backupsDir } from "../../server/db/back-up-database.ts";
import { migrateDatabase } from "../../server/db/migrate-database.ts";
import { databaseFile, openDatabase } from "../../server/db/open-database.ts";
import { createLog } from "../../server/log.ts";
import { pushEntries } from "../../server/services/push-entries.ts";
import { userResponseSchema } from "../../shared/schemas/auth.ts";
import { bikeEntry, checkEntry, hoursEntry, newId } from "../helpers/make-entry.ts";

const BIKES = 10_000;
const SHARED = 1_000;
const BIKES_EACH = 10;
const CHECKS = [3, 15];
const PAGE = 50;
const ROUNDS = 200;

const dataDir = mkdtempSync(path.join(tmpdir(), "sumpless-bench-"));
process.once("exit", () => rmSync(dataDir, { recursive: true, force: true }));
const config = readConfig({ DATA_DIR: dataDir });
const database = openDatabase(databaseFile(dataDir));
await migrateDatabase(database, backupsDir(dataDir));
const { app, services, store } = createApp(config, database, createLog("silent"));

function addUser(name: string): string {
  const id = newId();
  const createdAt = new Date().toISOString();
  const account = { name, email: `${id}@club.example`, passwordHash: "none", verified: false };
  store.users.add({ id, ...account, createdAt });
  return id;
}

/** So many checks, 20 h and 40 days apart, with an hour reading after each; no two bikes are alike. */
const logOf = (bikeId: string, n: number, checks: number, from: number) =>
  Array.from({ length: checks }, (_, past) => from + past).flatMap((number) => {
    const at = (days: number) => subDays(new Date(), 40 * (30 - number) - days).toISOString();
    const endMl = 3 - ((n % 97) / 97) * 0.02 * number;
    const hours = 12 + 20 * number;
    return [
      checkEntry(bikeId, hours, Math.round(endMl * 20) / 20, at(0)),
      hoursEntry(bikeId, hours + (n % 19), at(20)),
    ];
  });

const server = app.listen(0, "127.0.0.1");
// While a log is written or a query timed, nobody answers for the connection.
server.keepAliveTimeout = 0;
await once(server, "listening");
const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/api`;

/** A mechanic's account, and the cookie it is known by. */
async function signUpMechanic() {
  const account = { name: "Mick", email: "mick@club.example", password: "two strokes and a pump" };
  const response = await fetch(`${url}/auth/sign-up`, {
    method: "POST",
    headers: { "content-type": "application/json", origin: config.publicOrigin },
    body: JSON.stringify(account),
  });
  const { user } = userResponseSchema.parse(await response.json());
  return { id: user.id, cookie: response.headers.getSetCookie()[0]!.split(";")[0]! };
}

const { id: mechanicId, cookie } = await signUpMechanic();
const clubId = services.clubs.add(mechanicId, "Moor Riders").id;
store.clubMembers.setRoles(clubId, mechanicId, { mechanic: true });
const bikes = Array.from({ length: BIKES / BIKES_EACH }, (_, owner) => {
  const ownerId = addUser(`Rider ${owner}`);
  return Array.from({ length: BIKES_EACH }, () => ({ ownerId, bikeId: newId() }));
}).flat();

/** A transaction for a hundred bikes: a disk sync for each would be most of the time. */
function pushToAll(log: (bikeId: string, n: number) => object[]): void {
  for (let from = 0; from < bikes.length; from += 100)
    store.write(() =>
      bikes.slice(from, from + 100).forEach(({ ownerId, bikeId }, n) => {
        pushEntries(store, ownerId, log(bikeId, from + n));
      }),
    );
}

function shareSome(): void {
  const every = BIKES / SHARED;
  store.write(() => {
    const joinedAt = new Date().toISOString();
    const roles = { organiser: false, mechanic: false };
    for (const { ownerId, bikeId } of bikes.filter((_, n) => n % every === 0)) {
      if (!store.clubMembers.find(clubId, ownerId))
        store.clubMembers.add({ clubId, userId: ownerId, ...roles, joinedAt });
      services.bikeShares.share(ownerId, bikeId, clubId);
    }
  });
}

async function medianMs(work: () => unknown): Promise<number> {
  const times: number[] = [];
  for (let round = 0; round < ROUNDS; round++) {
    const start = performance.now();
    await work();
    times.push(performance.now() - start);
  }
  return times.sort((a, b) => a - b)[ROUNDS / 2]!;
}

const top = { rank: -1, dueInHours: 0, bikeId: "" };
const boardUrl = `${url}/clubs/${clubId}/line-up?limit=${PAGE}`;
const ask = async (headers: Record<string, string> = {}) => {
  const response = await fetch(boardUrl, { headers: { cookie, ...headers } });
  return { etag: response.headers.get("etag") ?? "", bytes: (await response.text()).length };
};

async function medianKnownMs(): Promise<number> {
  const { etag } = await ask();
  return medianMs(() => ask({ "if-none-match": etag }));
}

async function measure() {
  const rows = store.bikeShares.board(clubId, top, SHARED + 1).length;
  const entries = database.$client.prepare("SELECT count(*) FROM entries").pluck().get();
  const { bytes } = await ask();
  return {
    "bikes on the board": rows,
    "entries in the database": entries,
    [`query, first ${PAGE} (ms)`]: await medianMs(() => store.bikeShares.board(clubId, top, PAGE)),
    "query, whole board (ms)": await medianMs(() => store.bikeShares.board(clubId, top, SHARED)),
    "page, board changed (ms)": await medianMs(() => (store.clubs.touch(clubId), ask())),
    "page, board kept (ms)": await medianMs(() => ask()),
    "page, known to the phone (ms)": await medianKnownMs(),
    "page, bytes before gzip": bytes,
  };
}

const results = [];
let made = 0;
for (const checks of CHECKS) {
  pushToAll((bikeId, n) => [
    ...(made === 0 ? [bikeEntry(bikeId, { name: `Bike ${n}` })] : []),
    ...logOf(bikeId, n, checks - made, made),
  ]);
  if (made === 0) shareSome();
  made = checks;
  results.push([`${2 * checks + 1} entries a bike`, await measure()] as const);
}
server.close();
server.closeAllConnections();
database.$client.close();

console.log(`The Line-up of ${SHARED} bikes of ${BIKES}`);
const round = (value: unknown) => (Number.isInteger(value) ? value : Number(value).toFixed(2));
const rounded = results.map(([title, figures]) => [
  title,
  Object.fromEntries(Object.entries(figures).map(([what, value]) => [what, round(value)])),
]);
const columns = Object.fromEntries(rounded) as Record<string, Record<string, unknown>>;
console.table(
  Object.fromEntries(
    Object.keys(results[0]![1]).map((what) => [
      what,
      Object.fromEntries(Object.entries(columns).map(([title, figures]) => [title, figures[what]])),
    ]),
  ),
);
