import { addDays, addMinutes } from "date-fns";
import { afterEach, expect, it, vi } from "vitest";
import { devicesResponseSchema } from "../../shared/schemas/account.ts";
import { PASSWORD, signInRider, signUpRider, createPhone, type Rider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const ON_A_PHONE =
  "Mozilla/5.0 (Linux; Android 14; X1) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/124.0.0.0 Mobile Safari/537.36";

afterEach(() => {
  vi.useRealTimers();
});

async function devicesOf({ phone }: Pick<Rider, "phone">) {
  const response = await phone.get("/api/account/devices");
  expect(response.status).toBe(200);
  return devicesResponseSchema.parse(response.body).devices;
}

it("a rider sees each device that is signed in, and which one this is", async () => {
  const server = await startTestServer();
  const rider = await signUpRider(server);
  const phone = createPhone(server).set("User-Agent", ON_A_PHONE);
  const credentials = { email: rider.user.email, password: PASSWORD };
  await phone.post("/api/auth/sign-in").send(credentials).expect(200);
  await signUpRider(server, "Bob");

  const seen = await devicesOf({ phone });
  const told = seen.map(({ name, current }) => [name, current]);
  expect(told.sort()).toEqual([
    ["Chrome on Android", true],
    ["Unknown browser", false],
  ]);
  const kept = JSON.stringify(server.database.$client.prepare("SELECT * FROM sessions").all());
  expect(kept).not.toMatch(/127\.0\.0\.1|X1|124/);
});

it("a device is marked as seen, to the hour", async () => {
  const rider = await signUpRider(await startTestServer());
  const [first] = await devicesOf(rider);
  const signedInAt = new Date(first!.signedInAt);
  const seenAfter = async (now: Date) => {
    vi.useFakeTimers({ toFake: ["Date"], now });
    return (await devicesOf(rider))[0];
  };
  expect(await seenAfter(addMinutes(signedInAt, 59))).toEqual(first);
  const later = addDays(signedInAt, 3);
  expect(await seenAfter(later)).toEqual({ ...first, seenAt: later.toISOString() });
});

it("a rider can end one device, and no other rider's", async () => {
  const server = await startTestServer();
  const rider = await signUpRider(server);
  const lost = await signInRider(server, rider.user.email);
  const other = await signUpRider(server, "Bob");
  const { id } = (await devicesOf(rider)).find(({ current }) => !current)!;
  await other.phone.delete(`/api/account/devices/${id}`).expect(404);
  await lost.phone.get("/api/auth/me").expect(200);
  await rider.phone.delete(`/api/account/devices/${id}`).expect(204);
  await rider.phone.delete(`/api/account/devices/${id}`).expect(404);
  await lost.phone.get("/api/auth/me").expect(401);
  await rider.phone.get("/api/auth/me").expect(200);
});

it("a rider can end every device but the one in hand", async () => {
  const server = await startTestServer();
  const rider = await signUpRider(server);
  const others = [
    await signInRider(server, rider.user.email),
    await signInRider(server, rider.user.email),
  ];
  const bob = await signUpRider(server, "Bob");
  await rider.phone.delete("/api/account/devices").expect(204);
  for (const { phone } of others) await phone.get("/api/auth/me").expect(401);
  expect(await devicesOf(rider)).toMatchObject([{ current: true }]);
  await bob.phone.get("/api/auth/me").expect(200);
});

it("a session that has run out is on nobody's list", async () => {
  const server = await startTestServer();
  const { user } = await signUpRider(server);
  vi.useFakeTimers({ toFake: ["Date"], now: addDays(new Date(), 91) });
  expect(await devicesOf(await signInRider(server, user.email))).toHaveLength(1);
});
