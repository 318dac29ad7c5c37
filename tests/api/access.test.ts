import supertest from "supertest";
import { expect, it } from "vitest";
import { devicesResponseSchema } from "../../shared/schemas/account.ts";
import { clubOfFour, giveRoles, makeClub, withdraw, type ClubOfFour } from "../helpers/club.ts";
import { listRoutes } from "../helpers/list-routes.ts";
import { newId } from "../helpers/make-entry.ts";
import { PASSWORD, signUpRider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

const who = ["owner", "mechanic", "organiser", "member", "outsider", "nobody"] as const;
const states = ["shared", "withdrawn"] as const;
type Who = (typeof who)[number];
type State = (typeof states)[number];

/**
 * Who is answered what by every route of the server, in the order of `who`; after the bar, once the
 * bike is no longer shared. The outsider is organiser and mechanic of another club; `:userId` is
 * the member, `:deviceId` the owner's phone. Bodies that change nothing are left wrong on purpose (422).
 */
const table: Record<string, { expected: string; body?: object }> = {
  "GET /health": { expected: "200 200 200 200 200 200" },
  "POST /unsubscribe": { expected: "422 422 422 422 422 422" },
  "GET /dev/mail": { expected: "404 404 404 404 404 404" },
  "GET /dev/mail/:name": { expected: "404 404 404 404 404 404" },

  "POST /auth/sign-up": { expected: "422 422 422 422 422 422" },
  "POST /auth/sign-in": { expected: "422 422 422 422 422 422" },
  "POST /auth/sign-out": { expected: "204 204 204 204 204 204" },
  "GET /auth/me": { expected: "200 200 200 200 200 401" },
  "POST /auth/verify-email": { expected: "422 422 422 422 422 422" },
  "POST /auth/request-password-reset": { expected: "422 422 422 422 422 422" },
  "POST /auth/reset-password": { expected: "422 422 422 422 422 422" },

  "GET /export": { expected: "200 200 200 200 200 401" },
  "GET /export/checks.csv": { expected: "200 200 200 200 200 401" },
  "DELETE /account": { expected: "204 204 204 204 204 401", body: { password: PASSWORD } },
  "POST /account/verification": { expected: "204 204 204 204 204 401" },
  "POST /account/email": {
    expected: "204 204 204 204 204 401",
    body: { email: "elsewhere@club.example", password: PASSWORD },
  },
  "POST /account/password": {
    expected: "204 204 204 204 204 401",
    body: { password: PASSWORD, newPassword: "another pump altogether" },
  },
  "GET /account/devices": { expected: "200 200 200 200 200 401" },
  "DELETE /account/devices": { expected: "204 204 204 204 204 401" },
  "DELETE /account/devices/:deviceId": { expected: "204 404 404 404 404 401" },
  "GET /account/reminders": { expected: "200 200 200 200 200 401" },
  "PUT /account/reminders": {
    expected: "200 200 200 200 200 401",
    body: { dueMails: false, stopMails: true },
  },

  "POST /sync": { expected: "200 200 200 200 200 401", body: { known: {}, entries: [] } },
  "GET /bikes": { expected: "200 200 200 200 200 401" },
  "GET /bikes/:bikeId": { expected: "200 200 404 404 404 401 | 200 404 404 404 404 401" },
  "DELETE /bikes/:bikeId": { expected: "204 404 404 404 404 401" },
  "GET /bikes/:bikeId/shares": { expected: "200 404 404 404 404 401" },
  "PUT /bikes/:bikeId/shares/:clubId": { expected: "204 404 404 404 404 401" },
  "DELETE /bikes/:bikeId/shares/:clubId": { expected: "204 404 404 404 404 401" },

  "GET /clubs": { expected: "200 200 200 200 200 401" },
  "POST /clubs": { expected: "201 201 201 201 201 401", body: { name: "Fell Riders" } },
  "GET /clubs/:clubId": { expected: "200 200 200 200 404 401" },
  "DELETE /clubs/:clubId": { expected: "404 404 204 404 404 401" },
  "GET /clubs/:clubId/members": { expected: "200 200 200 200 404 401" },
  "PUT /clubs/:clubId/members/:userId": {
    expected: "404 404 200 404 404 401",
    body: { mechanic: true },
  },
  "DELETE /clubs/:clubId/members/:userId": { expected: "404 404 204 204 404 401" },
  "GET /clubs/:clubId/invites": { expected: "404 404 200 404 404 401" },
  "POST /clubs/:clubId/invites": { expected: "404 404 201 404 404 401", body: {} },
  "DELETE /clubs/:clubId/invites/:inviteId": { expected: "404 404 204 404 404 401" },
  "GET /clubs/:clubId/line-up": { expected: "404 200 404 404 404 401" },
  "GET /invites/:token": { expected: "200 200 200 200 200 200" },
  "POST /invites/:token/accept": { expected: "200 200 200 200 200 401" },
};

interface World extends ClubOfFour {
  server: TestServer;
  deviceId: string;
  /** What each sends to be known by; nobody sends nothing. */
  cookies: Record<Who, string>;
}

async function makeWorld(state: State): Promise<World> {
  const server = await startTestServer();
  const four = await clubOfFour(server);
  const outsider = await signUpRider(server, "Una");
  const otherClub = await makeClub(outsider, "Fen Riders");
  await giveRoles(outsider, otherClub.id, outsider, { mechanic: true }).expect(200);
  if (state === "withdrawn") await withdraw(four.owner, four.bikeId, four.club.id);
  const { owner, mechanic, organiser, member } = four;
  const riders = Object.entries({ owner, mechanic, organiser, member, outsider });
  const cookies = Object.fromEntries(riders.map(([name, { cookie }]) => [name, cookie]));
  const { devices } = devicesResponseSchema.parse(
    (await owner.phone.get("/api/account/devices")).body,
  );
  const deviceId = devices[0]!.id;
  return { ...four, server, deviceId, cookies: { ...cookies, nobody: "" } as World["cookies"] };
}

/** The route's path with the world's ids, or with ids of nothing at all. */
function pathOf(
  route: string,
  { bikeId, club, member, invited, deviceId }: World,
  nothing = false,
): string {
  const ids: Record<string, string> = {
    bikeId,
    clubId: club.id,
    userId: member.user.id,
    inviteId: invited.invite.id,
    deviceId,
    token: invited.token,
  };
  const path = route
    .split(" ")[1]!
    .replace(/:(\w+)/g, (name, key: string) => (nothing ? newId() : (ids[key] ?? name)));
  return path.startsWith("/dev/") ? path : `/api${path}`;
}

/** Asks in a transaction that is taken back: every question finds the world as it was made. */
async function ask({ server, cookies }: World, name: Who, route: string, path: string) {
  const method = route.split(" ")[0]!.toLowerCase() as "get" | "post" | "put" | "delete";
  const { $client } = server.database;
  $client.exec("BEGIN IMMEDIATE");
  const headers = { Origin: server.origin, Cookie: cookies[name] };
  const asked = supertest(server.url)[method](path).set(headers);
  const answer = await (method === "get" ? asked : asked.send(table[route]?.body));
  $client.exec("ROLLBACK");
  return answer;
}

it("every route of the server stands in the table", async () => {
  const { app } = await startTestServer();
  expect(Object.keys(table).sort()).toEqual(listRoutes(app).sort());
});

it.each(states)(
  "every route answers each person as the table says, the bike %s",
  async (state) => {
    const world = await makeWorld(state);
    const answers: Record<string, string> = {};
    const expected: Record<string, string> = {};
    for (const [route, row] of Object.entries(table)) {
      const statuses: number[] = [];
      for (const name of who)
        statuses.push((await ask(world, name, route, pathOf(route, world))).status);
      answers[route] = statuses.join(" ");
      const [shared, withdrawn = shared] = row.expected.split(" | ");
      expected[route] = (state === "shared" ? shared : withdrawn)!;
    }
    expect(answers).toEqual(expected);
  },
  60_000,
);

it("what one may not see is not found in the same words as what is not there", async () => {
  const world = await makeWorld("withdrawn");
  for (const route of Object.keys(table))
    for (const name of who) {
      const answer = await ask(world, name, route, pathOf(route, world));
      if (answer.status !== 404) continue;
      const nothing = await ask(world, name, route, pathOf(route, world, true));
      expect([nothing.status, nothing.body], `${route}, ${name}`).toEqual([404, answer.body]);
    }
}, 60_000);
