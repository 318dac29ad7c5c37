import { randomUUID } from "node:crypto";
import supertest from "supertest";
import { expect } from "vitest";
import { userResponseSchema } from "../../shared/schemas/auth.ts";
import { summarySchema } from "../../shared/schemas/summary.ts";
import { syncResponseSchema, type SyncRequest } from "../../shared/schemas/sync.ts";
import type { TestServer } from "./start-test-server.ts";

export const PASSWORD = "two strokes and a pump";

/** A phone's browser: it keeps cookies, and says which page it calls from. */
export const createPhone = ({ url, origin }: Pick<TestServer, "url" | "origin">) =>
  supertest.agent(url).set("Origin", origin);

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

const asRider = (phone: Phone, body: unknown) => ({
  phone,
  user: userResponseSchema.parse(body).user,
  sync: (entries: unknown[], rest?: Partial<SyncRequest>) => sync(phone, entries, rest),
  summary: (bikeId: string) => readSummary(phone, bikeId),
});

/** A new account, signed in on a phone of its own. */
export async function signUpRider(server: TestServer, name = "Ann") {
  const phone = createPhone(server);
  const email = `${name.toLowerCase()}-${randomUUID()}@club.example`;
  const response = await phone.post("/api/auth/sign-up").send({ email, password: PASSWORD, name });
  expect(response.status).toBe(201);
  return asRider(phone, response.body);
}

/** Another phone of the same rider. */
export async function signInRider(server: TestServer, email: string, password = PASSWORD) {
  const phone = createPhone(server);
  const response = await phone.post("/api/auth/sign-in").send({ email, password });
  expect(response.status).toBe(200);
  return asRider(phone, response.body);
}

export type Rider = Awaited<ReturnType<typeof signUpRider>>;
