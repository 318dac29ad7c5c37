import fc from "fast-check";
import { writeFileSync } from "node:fs";
import { Agent } from "node:http";
import path from "node:path";
import { setFlagsFromString } from "node:v8";
import { runInNewContext } from "node:vm";
import { expect, it, onTestFinished } from "vitest";
import { createSessions } from "../../server/auth/session.ts";
import { invite, makeClub, share } from "../helpers/club.ts";
import { arbitraryRequest, CLIENT_FILES } from "../helpers/fuzz/arbitrary-request.ts";
import { routeBodies } from "../helpers/fuzz/route-bodies.ts";
import { arbitraryBytes, sendBytes } from "../helpers/fuzz/send-bytes.ts";
import { sendRequest, wrongWith, type FuzzTarget } from "../helpers/fuzz/send-request.ts";
import { listRoutes } from "../helpers/list-routes.ts";
import { newId, smallLog } from "../helpers/make-entry.ts";
import { signUpRider } from "../helpers/rider.ts";
import { startTestServer, temporaryDir, type TestServer } from "../helpers/start-test-server.ts";

/** `npm run torture -- fuzz` sends many more. */
const REQUESTS = Number(process.env.REQUESTS ?? 600);
/** A rider's requests before another takes over: below what the limits allow one account. */
const BATCH = 100;
const SEED = 7;
/** More than a warm server's heap moves by chance, less than a leak of a kilobyte a request adds up to. */
const LEVEL_MB = 24;

const agent = new Agent({ keepAlive: true });

/** A rider with something of everything that routes have ids for. */
async function makeTarget(server: TestServer, batch: number): Promise<FuzzTarget> {
  // Addresses are used again after a while: so are the limits' counters.
  const from = `198.51.100.${batch % 100}`;
  const rider = await signUpRider({ ...server, from });
  const bikeId = newId();
  await rider.sync(smallLog(bikeId));
  const club = await makeClub(rider);
  const invited = await invite(rider, club.id, { uses: 10 });
  await share(rider, bikeId, club.id);
  const ids = {
    bikeId,
    clubId: club.id,
    userId: rider.user.id,
    inviteId: invited.invite.id,
    token: invited.token,
    deviceId: "none",
    name: "none",
    file: "index.html",
  };
  return { ...server, cookie: rider.cookie, ids, from, agent };
}

/** The rider signed in again, whom a request signed out; another, where it erased the account. */
async function returned(server: TestServer, target: FuzzTarget): Promise<FuzzTarget> {
  const { userId } = target.ids;
  if (!server.store.users.find(userId!)) return makeTarget(server, 0);
  const cookie = createSessions(server.database, server.origin).begin(userId!, {});
  return { ...target, cookie: cookie.split(";")[0]! };
}

/** MB of living objects. */
function heapMb(): number {
  setFlagsFromString("--expose-gc");
  const collect = runInNewContext("gc") as () => void;
  collect();
  return process.memoryUsage().heapUsed / 2 ** 20;
}

it("the bodies that are made up are those of routes that there are", async () => {
  const { app } = await startTestServer();
  expect(listRoutes(app)).toEqual(expect.arrayContaining(Object.keys(routeBodies)));
});

it(
  `every route takes ${REQUESTS} strange requests without failing, telling its inside or leaking`,
  { timeout: 3_600_000 },
  async () => {
    onTestFinished(() => agent.destroy());
    const clientDir = temporaryDir();
    writeFileSync(path.join(clientDir, "index.html"), "<!doctype html>");
    const server = await startTestServer({ trustedProxies: 1, clientDir });
    const routes = [...listRoutes(server.app), CLIENT_FILES, CLIENT_FILES];
    const statuses: Record<number, number> = {};
    const heaps: number[] = [];
    const batches = Math.ceil(REQUESTS / BATCH);
    for (let batch = 0; batch < batches; batch++) {
      let target = await makeTarget(server, batch);
      const property = fc.asyncProperty(arbitraryRequest(routes), async (request) => {
        const status = await sendRequest(request, target);
        statuses[status] = (statuses[status] ?? 0) + 1;
        if (status === 401 && request.cookie === "own") target = await returned(server, target);
      });
      await fc.assert(property, { numRuns: BATCH, seed: SEED + batch });
      heaps.push(heapMb());
    }
    // Where every request bounced off the door, nothing behind it was tried.
    for (const status of [200, 201, 204, 400, 401, 403, 404, 415, 422])
      expect(statuses[status], JSON.stringify(statuses)).toBeGreaterThan(0);
    const warm = heaps[Math.floor(batches / 4)]!;
    expect(heaps.at(-1)! - warm, JSON.stringify(heaps)).toBeLessThan(LEVEL_MB);
    if (process.env.REQUESTS)
      console.log({ statuses, heaps: heaps.filter((_, n) => n % 25 === 0) });
  },
);

it(
  "a line that carries no HTTP is answered or closed, and the others go on",
  { timeout: 600_000 },
  async () => {
    const server = await startTestServer();
    const property = fc.asyncProperty(arbitraryBytes, async (bytes) => {
      const answer = await sendBytes(server.url, bytes);
      expect(answer).not.toMatch(/^HTTP\/1.1 5|\bat .*\.[cm]?[jt]s:\d|node_modules/m);
    });
    await fc.assert(property, { numRuns: Math.min(REQUESTS / 5, 5_000), seed: SEED });
    await signUpRider(server);
  },
);

it.each([
  [500, "application/problem+json; charset=utf-8", "{}"],
  [404, "text/html", "Not found"],
  [
    400,
    "application/problem+json; charset=utf-8",
    "Error\n    at parse (/srv/server/index.js:3:1)",
  ],
  [404, "application/problem+json; charset=utf-8", '{"status":404}'],
])("an answer %s of type %s would be found out", (status, type, text) => {
  expect(wrongWith(status, type, text)).not.toBeNull();
});
