import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { Entry } from "../../shared/schemas/entry.ts";
import type { SyncRequest } from "../../shared/schemas/sync.ts";
import {
  forgetAccount,
  rememberAccount,
  saveEntry,
  startSyncing,
  syncNow,
  type Account,
  type NewEntry,
} from "./index.ts";
import { phoneOf } from "./logbook/phone.ts";

const newBike = (bikeId: string): NewEntry => ({
  bikeId,
  kind: "bike",
  at: "2026-03-01T09:00:00.000Z",
  hours: null,
  body: { name: "Blue" },
});

let riders = 0;
const someone = (): Account => ({
  id: `syncing-${(riders += 1)}`,
  name: "Ada",
  email: "ada@club.example",
});

const storesAll = ({ entries }: SyncRequest) => ({
  epoch: "one",
  results: entries.map((entry, index) => ({ index, id: (entry as Entry).id, status: "stored" })),
  bikes: [],
  gone: [],
  more: false,
});

const sent: SyncRequest[] = [];
/** Answers that the network holds back for as long as this is a list. */
let held: (() => void)[] | null;
let stop: () => void;

function network(_: string, { body }: { body: string }): Promise<Response> {
  const request = JSON.parse(body) as SyncRequest;
  sent.push(request);
  return new Promise((resolve) => {
    const answer = () => resolve(Response.json(storesAll(request)));
    if (held) held.push(answer);
    else answer();
  });
}

async function unsentOf(account: Account): Promise<number> {
  return (await phoneOf(account).open()).countFromIndex("entries", "unsent");
}

describe("syncing while the page is open", () => {
  beforeEach(() => {
    sent.length = 0;
    held = null;
    vi.stubGlobal("fetch", network);
  });
  afterEach(() => {
    stop();
    forgetAccount();
    vi.unstubAllGlobals();
  });

  it("sends an entry as soon as it is saved", async () => {
    const account = someone();
    rememberAccount(account);
    stop = startSyncing();
    await syncNow();
    await saveEntry(newBike("0193a000-0000-7000-8000-000000000001"));
    await expect.poll(() => unsentOf(account)).toBe(0);
    expect(sent.at(-1)).toMatchObject({ account: account.id, entries: [{ kind: "bike" }] });
  });

  it("changes nothing by an answer that comes after someone else has signed in", async () => {
    const [first, second] = [someone(), someone()];
    rememberAccount(first);
    await saveEntry(newBike("0193a000-0000-7000-8000-000000000002"));
    held = [];
    stop = startSyncing();
    await expect.poll(() => held).toHaveLength(1);
    const [answerFirst] = held;
    held = null;
    rememberAccount(second);
    await syncNow();
    answerFirst!();
    await syncNow();
    expect(await unsentOf(first)).toBe(1);
    expect(sent.slice(1).map(({ account, entries }) => [account, entries])).toContainEqual([
      second.id,
      [],
    ]);

    rememberAccount(first);
    await expect.poll(() => unsentOf(first)).toBe(0);
  });

  it("does nothing once ended", async () => {
    rememberAccount(someone());
    stop = startSyncing();
    await syncNow();
    stop();
    sent.length = 0;
    await syncNow();
    window.dispatchEvent(new Event("online"));
    expect(sent).toEqual([]);
  });
});
