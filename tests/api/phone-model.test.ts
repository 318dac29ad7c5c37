/**
 * Whatever three phones, two riders, a bad network and a server restored from a backup do, in
 * whatever order: nothing is lost, nothing doubled, nothing shown to the wrong person.
 * `MODEL_RUNS` makes it longer, `MODEL_SEED` another one.
 */
import fc from "fast-check";
import { expect, it } from "vitest";
import type { WiredPhone } from "../helpers/phones/wired-phone.ts";
import {
  createWorld,
  end,
  perform,
  storesOf,
  type Step,
  type World,
} from "../helpers/phones/phone-world.ts";

const device = fc.nat({ max: 2 });
const pick = fc.nat({ max: 1_000 });
const year = fc.constantFrom(1970, 2025, 2026, 2027, 2099);
const network = fc.constantFrom(
  "good",
  "no-request",
  "no-answer",
  "twice",
  "portal",
  "late",
  "overtaken",
);
const waiting = fc.constantFrom("request", "answer");
/** Plain objects, so that a counterexample can be read. */
const step = <T>(fields: { [K in keyof T]: fc.Arbitrary<T[K]> }) =>
  fc.record(fields, { noNullPrototype: true });
const does = <T extends Step["does"]>(name: T) => fc.constant(name);

const anyStep: fc.Arbitrary<Step> = fc.oneof(
  { weight: 3, arbitrary: step({ does: does("register"), device, year }) },
  { weight: 8, arbitrary: step({ does: does("write"), device, year, pick }) },
  { weight: 3, arbitrary: step({ does: does("strike"), device, year, pick }) },
  { weight: 10, arbitrary: step({ does: does("sync"), device, network }) },
  { weight: 2, arbitrary: step({ does: does("switch-account"), device }) },
  { weight: 1, arbitrary: step({ does: does("sync-as-other"), device }) },
  { weight: 1, arbitrary: step({ does: does("sign-out-and-in"), device }) },
  { weight: 2, arbitrary: step({ does: does("reload"), device, waiting }) },
  { weight: 1, arbitrary: step({ does: does("upgrade"), device }) },
  { weight: 1, arbitrary: step({ does: does("erase"), device, pick }) },
  { weight: 2, arbitrary: step({ does: does("back-up") }) },
  { weight: 1, arbitrary: step({ does: does("restore") }) },
  { weight: 1, arbitrary: step({ does: does("upgrade-server") }) },
);

const rowsOf = async (phone: WiredPhone) => (await phone.open()).getAll("entries");

/** Nobody sees a bike they may not: on no phone is there a row of another account's bike. */
async function seesOwnBikesOnly({ owners }: World, phone: WiredPhone): Promise<void> {
  const rows = [...(await phone.bikes()), ...(await rowsOf(phone)).map(({ entry }) => entry)];
  expect(new Set(rows.map(({ bikeId }) => owners.get(bikeId))).size).toBeLessThanOrEqual(1);
  for (const { bikeId } of rows) expect(owners.get(bikeId)).toBe(phone.account.id);
}

/** What a rider was told is saved stays on the phone, unless the bike was erased. */
async function holdsWhatItSaved({ saved, erased }: World, phone: WiredPhone) {
  const there = new Set((await rowsOf(phone)).map(({ entry }) => entry.id));
  for (const [id, bikeId] of saved.get(phone) ?? [])
    if (!erased.has(bikeId)) expect(there).toContain(id);
}

/** What a phone calls sent, the server has, as it is; a restored one once the phone knows of it. */
async function sentIsThere({ server, erased }: World, phone: WiredPhone): Promise<void> {
  const sync = await (await phone.open()).get("meta", "sync");
  if (sync?.epoch !== server.store.epoch.current()) return;
  for (const { entry, unsentSince } of await rowsOf(phone)) {
    if (unsentSince !== undefined || erased.has(entry.bikeId)) continue;
    const { id, bikeId, kind, at } = entry;
    const author = { authorId: phone.account.id };
    expect(server.store.entries.find(id)).toMatchObject({ id, bikeId, kind, at, ...author });
  }
}

async function checkPromises(world: World): Promise<void> {
  for (const phone of storesOf(world)) {
    await seesOwnBikesOnly(world, phone);
    await holdsWhatItSaved(world, phone);
    await sentIsThere(world, phone);
  }
}

/** All that a phone shows of an account, but for when it stored it and what is refused for good. */
async function shownBy(phone: WiredPhone) {
  const bikes = await Promise.all((await phone.bikes()).map(({ bikeId }) => phone.bike(bikeId)));
  return bikes.map((bike) => ({
    details: bike!.record.details,
    summary: bike!.record.summary,
    log: bike!.log.map(({ savedAt: _, ...line }) => line),
  }));
}

/** Every phone finds the network, with each of its accounts, and then once more. */
async function syncEverything(world: World): Promise<void> {
  for (let round = 0; round < 2; round += 1)
    for (const phone of storesOf(world)) await phone.sync();
}

async function checkAgreement(world: World): Promise<void> {
  for (const index of world.riders.keys()) {
    const phones = world.devices.map(({ stores }) => stores[index]!);
    const shown = await shownBy(phones[0]!);
    for (const phone of phones) {
      expect(await shownBy(phone)).toEqual(shown);
      for (const line of await phone.unsent())
        expect(line).toMatchObject({ state: "refused", reason: "erased" });
    }
    for (const { summary } of shown)
      expect(await phones[0]!.serverSummary(summary.bikeId)).toEqual(summary);
  }
}

/** The server has what riders saved, each once and nothing else, but for what was erased. */
function checkServer({ server, saved, owners, erased }: World): void {
  const everything = [...saved.values()].flatMap((entries) => [...entries]);
  const kept = everything.filter(([, bikeId]) => !erased.has(bikeId)).map(([id]) => id);
  const stored = [...owners.keys()].flatMap((bikeId) => server.store.entries.ofBike(bikeId));
  expect(stored.map(({ id }) => id).sort()).toEqual(kept.sort());
}

async function live(steps: Step[]): Promise<void> {
  const world = await createWorld();
  for (const step of steps) {
    await perform(world, step);
    await checkPromises(world);
  }
  await syncEverything(world);
  await checkPromises(world);
  await checkAgreement(world);
  checkServer(world);
  await end(world);
}

const RUNS = Number(process.env.MODEL_RUNS ?? 15);
const SEED = Number(process.env.MODEL_SEED ?? 1);
/** So many in a test: what one leaves behind is cleared before the next. */
const BATCH = 250;
const batches = Array.from({ length: Math.ceil(RUNS / BATCH) }, (_, index) => ({
  seed: SEED + index,
  numRuns: Math.min(BATCH, RUNS - index * BATCH),
}));

it.each(batches)(
  "keeps every promise about saving and sending ($numRuns lives, seed $seed)",
  { timeout: 1_800_000 },
  async (batch) => {
    const steps = fc.array(anyStep, { minLength: 10, maxLength: 40 });
    await fc.assert(fc.asyncProperty(steps, live), { ...batch, endOnFailure: true });
  },
);
