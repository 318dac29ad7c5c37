import { randomUUID } from "node:crypto";
import supertest, { type Response } from "supertest";
import { expect } from "vitest";
import { userResponseSchema } from "../../shared/schemas/auth.ts";
import { summarySchema } from "../../shared/schemas/summary.ts";
import { syncResponseSchema, type SyncRequest } from "../../shared/schemas/sync.ts";
import { bikeEntry, newId } from "./make-entry.ts";

export const PASSWORD = "two strokes and a pump";

/** Where a server listens, and the origin it takes for its own. */
export interface Served {
  url: string;
  origin: string;
  /** The address that a proxy in front says the caller has. */
  from?: string;
}

/** A phone's browser: it keeps cookies, and says which page it calls from. */
export const createPhone = ({ url, origin, from }: Served) =>
  supertest.agent(url).set({ Origin: origin, ...(from && { "X-Forwarded-For": from }) });

export type Phone = ReturnType<typeof createPhone>;

/** One round of sync, its answer held to its schema. */
async function sync(phone: Phone, entries: unknown[], rest: Partial<SyncRequest> = {}) {
  const response = await phone.post("/api/sync").send({ known: {}, ...rest, entries });
  expect(response.status).toBe(200);
  return syncResponseSchema.parse(response.body);
}

async function readSummary(phone: Phone, bikeId: string) {
  const response = await phone.get(`/api/bikes/${bikeId}`);
  expect(response.status).toBe(200);
  return summarySchema.parse(response.body);
}

/** The first cookie that an answer sets, as it is sent back. */
export const cookieOf = (response: Response) =>
  response.get("Set-Cookie")?.[0]?.split(";")[0] ?? "";

const asRider = (phone: Phone, signedIn: Response) => ({
  phone,
  user: userResponseSchema.parse(signedIn.body).user,
  cookie: cookieOf(signedIn),
  sync: (entries: unknown[], rest?: Partial<SyncRequest>) => sync(phone, entries, rest),
  summary: (bikeId: string) => readSummary(phone, bikeId),
});

/** A new account, signed in on a phone of its own. */
export async function signUpRider(server: Served, name = "Ann") {
  const phone = createPhone(server);
  const email = `rider-${randomUUID()}@club.example`;
  const response = await phone.post("/api/auth/sign-up").send({ email, password: PASSWORD, name });
  expect(response.status).toBe(201);
  return asRider(phone, response);
}

/** A new account with one registered bike. */
export async function riderWithBike(server: Served) {
  const rider = await signUpRider(server);
  const bikeId = newId();
  await rider.sync([bikeEntry(bikeId)]);
  return { rider, bikeId };
}

/** Another phone of the same rider. */
export async function signInRider(server: Served, email: string, password = PASSWORD) {
  const phone = createPhone(server);
  const response = await phone.post("/api/auth/sign-in").send({ email, password });
  expect(response.status).toBe(200);
  return asRider(phone, response);
}

export type Rider = Awaited<ReturnType<typeof signUpRider>>;
