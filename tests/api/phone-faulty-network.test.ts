/**
 * Two phones of one rider behind a network that drops, delays, cuts and doubles, and sends the pages
 * of a captive portal: nothing is lost, nothing doubled. `EXCHANGES` makes it longer.
 */
import fc from "fast-check";
import { setTimeout as sleep } from "node:timers/promises";
import { expect, it } from "vitest";
import { ApiError, NoNetworkError } from "../../src/offline/errors.ts";
import type { NewEntry } from "../../src/offline/types.ts";
import { faults, startFaultProxy } from "../helpers/fault-proxy.ts";
import { bikeEntry, newId, noteEntry } from "../helpers/make-entry.ts";
import { wiredPhone, type WiredPhone } from "../helpers/phones/wired-phone.ts";
import { signUpRider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const EXCHANGES = Number(process.env.EXCHANGES ?? 60);

/** One try; a server that asks to be left alone for a while is, as the app would. */
async function trySync(phone: WiredPhone): Promise<boolean> {
  try {
    await phone.sync();
    return true;
  } catch (error) {
    if (error instanceof ApiError && error.status === 429) await sleep(error.retryAfterMs!);
    else if (!(error instanceof NoNetworkError) && !(error instanceof ApiError)) throw error;
    return false;
  }
}

async function syncAtLast(phone: WiredPhone): Promise<void> {
  if (!(await trySync(phone))) await phone.sync();
}

it(`loses and doubles nothing in ${EXCHANGES} exchanges`, { timeout: 1_800_000 }, async () => {
  const server = await startTestServer();
  const rider = await signUpRider(server);
  const drawn = fc.sample(fc.constantFrom(...faults), { numRuns: EXCHANGES, seed: 4 });
  const proxy = await startFaultProxy(
    () => server.url,
    () => drawn.pop() ?? "none",
  );
  const served = { ...server, url: proxy.url };
  const phones = ["first", "second"].map((device) =>
    wiredPhone(rider.user, { server: () => served, cookie: () => rider.cookie, device }),
  );
  const bikeId = newId();
  const saved = new Set<string>();
  const save = async (phone: WiredPhone, entry: object) =>
    saved.add((await phone.keep(entry as NewEntry)).entry.id);

  await save(phones[0]!, bikeEntry(bikeId));
  for (let turn = 0; drawn.length > 0; turn += 1) {
    const phone = phones[turn % phones.length]!;
    if (await phone.bike(bikeId)) await save(phone, noteEntry(bikeId, `Turn ${turn}`));
    await trySync(phone);
  }
  // The network is well again: each phone sends, then fetches what the other sent.
  for (const phone of [...phones, ...phones]) await syncAtLast(phone);

  expect(proxy.exchanges()).toBeGreaterThanOrEqual(EXCHANGES);
  const stored = server.store.entries.ofBike(bikeId).map(({ id }) => id);
  expect(stored.sort()).toEqual([...saved].sort());
  for (const phone of phones) {
    expect(await phone.unsent()).toEqual([]);
    const { log } = (await phone.bike(bikeId))!;
    expect(log.map(({ entry }) => entry.id).sort()).toEqual(stored);
    expect(log.every(({ state }) => state === "sent")).toBe(true);
  }
});
