/** Three phones, two riders and a server, and what they can do to each other. */
import { rmSync } from "node:fs";
import path from "node:path";
import { expect } from "vitest";
import { backUpDatabase, backupsDir } from "../../../server/db/back-up-database.ts";
import { eraseBike } from "../../../server/services/erase.ts";
import { restoreDatabase } from "../../../server/services/restore-database.ts";
import { rebuildSummaries } from "../../../server/services/summarise-bike.ts";
import { ApiError, NoNetworkError } from "../../../src/offline/errors.ts";
import type { BikeRow } from "../../../src/offline/logbook/database.ts";
import type { NewEntry } from "../../../src/offline/types.ts";
import { bikeEntry, checkEntry, hoursEntry, newId, noteEntry, strikeEntry } from "../make-entry.ts";
import { signInRider, signUpRider, type Rider } from "../rider.ts";
import { startTestServer, type TestServer } from "../start-test-server.ts";
import { networks, slowNetwork } from "./networks.ts";
import { wiredPhone, type Network, type WiredPhone } from "./wired-phone.ts";

const DEVICES = 3;

export type Step =
  | { does: "register"; device: number; year: number }
  | { does: "write"; device: number; year: number; pick: number }
  | { does: "strike"; device: number; year: number; pick: number }
  | { does: "sync"; device: number; network: keyof typeof networks | "late" | "overtaken" }
  | { does: "sync-as-other"; device: number }
  | { does: "sign-out-and-in"; device: number }
  | { does: "reload"; device: number; waiting: "request" | "answer" }
  | { does: "upgrade"; device: number }
  | { does: "switch-account"; device: number }
  | { does: "erase"; device: number; pick: number }
  | { does: "back-up" }
  | { does: "restore" }
  | { does: "upgrade-server" };

/** A phone as a thing: whoever is signed in, each account's store stays on it. */
interface Device {
  signedIn: number;
  stores: WiredPhone[];
}

export interface World {
  server: TestServer;
  riders: Rider[];
  devices: Device[];
  /** What riders were told is saved, by the store they were saved in: each entry's id and bike. */
  saved: Map<WiredPhone, Map<string, string>>;
  /** Whose bike it is, erased ones included. */
  owners: Map<string, string>;
  erased: Set<string>;
  backup: string | null;
}

let worlds = 0;

export async function createWorld(): Promise<World> {
  const server = await startTestServer();
  const riders = [await signUpRider(server, "Ann"), await signUpRider(server, "Bob")];
  const name = `world-${(worlds += 1)}`;
  const world: World = {
    server,
    riders,
    devices: [],
    saved: new Map(),
    owners: new Map(),
    erased: new Set(),
    backup: null,
  };
  const wire = ({ user }: Rider, index: number, device: number) =>
    wiredPhone(user, {
      server: () => world.server,
      cookie: () => world.riders[index]!.cookie,
      device: `${name}-device-${device}`,
    });
  for (let device = 0; device < DEVICES; device += 1)
    world.devices.push({
      signedIn: device % riders.length,
      stores: riders.map((rider, index) => wire(rider, index, device)),
    });
  return world;
}

export const storesOf = ({ devices }: World): WiredPhone[] =>
  devices.flatMap(({ stores }) => stores);

/** Nothing of a world is left behind, so that there is room for thousands. */
export async function end(world: World): Promise<void> {
  await world.server.stop();
  rmSync(world.server.dataDir, { recursive: true });
  for (const store of storesOf(world)) await store.discard();
}

function inHand(world: World, device: number): WiredPhone {
  const { stores, signedIn } = world.devices[device]!;
  return stores[signedIn]!;
}

const choose = <T>(from: readonly T[], pick: number): T | undefined => from[pick % from.length];

/** A phone's clock may say anything. */
const clockOf = (year: number) => new Date(Date.UTC(year, 2, 1, 9));

async function save(world: World, phone: WiredPhone, entry: object, year: number): Promise<void> {
  phone.clock.now = clockOf(year);
  const { entry: kept } = await phone.keep({
    ...entry,
    at: clockOf(year).toISOString(),
  } as NewEntry);
  const saved = world.saved.get(phone) ?? new Map<string, string>();
  world.saved.set(phone, saved.set(kept.id, kept.bikeId));
}

async function register(world: World, phone: WiredPhone, year: number): Promise<void> {
  const bikeId = newId();
  world.owners.set(bikeId, phone.account.id);
  await save(world, phone, bikeEntry(bikeId), year);
}

async function write(world: World, phone: WiredPhone, pick: number, year: number): Promise<void> {
  const bike = choose(await phone.bikes(), pick);
  if (!bike) return;
  const { bikeId } = bike;
  const reading = (pick % 90) + 1;
  const entries = [
    hoursEntry(bikeId, reading),
    checkEntry(bikeId, reading, 2 + (pick % 10) / 10),
    noteEntry(bikeId, `Note ${pick}`),
  ];
  await save(world, phone, choose(entries, pick)!, year);
}

async function strike(world: World, phone: WiredPhone, pick: number, year: number): Promise<void> {
  const rows = await (await phone.open()).getAll("entries");
  const targets = rows.filter(({ entry }) => !["bike", "strike"].includes(entry.kind));
  const entry = choose(targets, pick)?.entry;
  if (entry && (await phone.bike(entry.bikeId)))
    await save(world, phone, strikeEntry(entry.bikeId, entry.id), year);
}

/** What a phone bears with every day. Anything else is a fault of ours. */
function bear(error: unknown): void {
  if (!(error instanceof NoNetworkError) && !(error instanceof ApiError)) throw error;
}

/** Another session comes and goes before the first one's request has arrived, or its answer. */
async function syncOvertaken(phone: WiredPhone, holds: "request" | "answer"): Promise<void> {
  const { network, letThrough } = slowNetwork(holds);
  const first = phone.sync(network).catch(bear);
  await phone.sync().catch(bear);
  letThrough();
  await first;
}

const withCookie =
  (cookie: string): Network =>
  (input, init) =>
    fetch(input, { ...init, headers: { ...(init?.headers as Record<string, string>), cookie } });

/** Another has signed in, and this account's page has not noticed yet. */
async function syncAsOther(world: World, phone: WiredPhone): Promise<void> {
  const other = world.riders.find(({ user }) => user.id !== phone.account.id)!;
  await expect(phone.sync(withCookie(other.cookie))).rejects.toMatchObject({ status: 409 });
}

/** The session ends; what is written meanwhile stays, until its rider has signed in again. */
async function signOutAndIn(world: World, phone: WiredPhone): Promise<void> {
  const { server, riders } = world;
  const index = riders.findIndex(({ user }) => user.id === phone.account.id);
  const { user, cookie } = riders[index]!;
  const headers = { origin: server.origin, cookie };
  await fetch(new URL("/api/auth/sign-out", server.url), { method: "POST", headers });
  await expect(phone.sync()).rejects.toMatchObject({ status: 401 });
  riders[index] = await signInRider(server, user.email);
}

/** The page goes while it sends; its request still arrives, and the answer finds nobody. */
async function reload(phone: WiredPhone, waiting: "request" | "answer"): Promise<void> {
  const { network, letThrough } = slowNetwork(waiting);
  const first = phone.sync(network).catch(bear);
  await phone.reload();
  letThrough();
  await first;
}

/** A newer build opens: what the one before made of the log, it can make nothing of. */
async function upgrade(phone: WiredPhone): Promise<void> {
  const database = await phone.open();
  for (const { bikeId, access, rev, unsent } of await database.getAll("bikes")) {
    const older = { bikeId, access, rev, unsent, format: 0, builtWith: "an earlier build" };
    await database.put("bikes", older as BikeRow);
  }
  await phone.reload();
}

function erase(world: World, phone: WiredPhone, pick: number): void {
  const { store } = world.server;
  const bikeId = choose(store.bikes.idsOf(phone.account.id), pick);
  if (bikeId === undefined) return;
  eraseBike(store, phone.account.id, bikeId);
  world.erased.add(bikeId);
}

async function backUp(world: World): Promise<void> {
  const { database, dataDir } = world.server;
  world.backup = path.join(backupsDir(dataDir), `${newId()}.sqlite`);
  await backUpDatabase(database.$client, world.backup);
}

/** The server is stopped, something is done to its files, and it starts again. */
async function restart(world: World, meanwhile?: (dataDir: string) => Promise<unknown>) {
  const { dataDir } = world.server;
  await world.server.stop();
  await meanwhile?.(dataDir);
  world.server = await startTestServer({ dataDir });
}

async function restore(world: World): Promise<void> {
  const { backup } = world;
  if (backup !== null) await restart(world, (dataDir) => restoreDatabase(dataDir, backup));
}

async function upgradeServer(world: World): Promise<void> {
  await restart(world);
  rebuildSummaries(world.server.store);
}

export async function perform(world: World, step: Step): Promise<void> {
  if (step.does === "back-up") return backUp(world);
  if (step.does === "restore") return restore(world);
  if (step.does === "upgrade-server") return upgradeServer(world);
  const phone = inHand(world, step.device);
  if (step.does === "register") return register(world, phone, step.year);
  if (step.does === "write") return write(world, phone, step.pick, step.year);
  if (step.does === "strike") return strike(world, phone, step.pick, step.year);
  if (step.does === "erase") return erase(world, phone, step.pick);
  if (step.does === "sync-as-other") return syncAsOther(world, phone);
  if (step.does === "sign-out-and-in") return signOutAndIn(world, phone);
  if (step.does === "reload") return reload(phone, step.waiting);
  if (step.does === "upgrade") return upgrade(phone);
  if (step.does === "switch-account") {
    const device = world.devices[step.device]!;
    device.signedIn = (device.signedIn + 1) % device.stores.length;
    return;
  }
  if (step.network === "late") return syncOvertaken(phone, "answer");
  if (step.network === "overtaken") return syncOvertaken(phone, "request");
  await phone.sync(networks[step.network]).catch(bear);
}
