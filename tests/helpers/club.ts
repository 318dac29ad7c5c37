import { expect } from "vitest";
import {
  clubResponseSchema,
  lineUpResponseSchema,
  newInviteResponseSchema,
  type Club,
  type NewInvite,
} from "../../shared/schemas/club.ts";
import { newId, smallLog } from "./make-entry.ts";
import { signUpRider, type Rider, type Served } from "./rider.ts";

/** A new club, made by its organiser. */
export async function makeClub({ phone }: Rider, name = "Moor Riders"): Promise<Club> {
  const response = await phone.post("/api/clubs").send({ name });
  expect(response.status).toBe(201);
  return clubResponseSchema.parse(response.body).club;
}

export async function invite({ phone }: Rider, clubId: string, wanted: Partial<NewInvite> = {}) {
  const response = await phone.post(`/api/clubs/${clubId}/invites`).send(wanted);
  expect(response.status).toBe(201);
  const { url, ...made } = newInviteResponseSchema.parse(response.body);
  return { ...made, url, token: new URL(url).searchParams.get("token") ?? "" };
}

export const join = ({ phone }: Rider, token: string) =>
  phone.post(`/api/invites/${token}/accept`).expect(200);

export const giveRoles = (
  { phone }: Rider,
  clubId: string,
  { user }: Rider,
  roles: { organiser?: boolean; mechanic?: boolean },
) => phone.put(`/api/clubs/${clubId}/members/${user.id}`).send(roles);

export const share = ({ phone }: Rider, bikeId: string, clubId: string) =>
  phone.put(`/api/bikes/${bikeId}/shares/${clubId}`).expect(204);

export const withdraw = ({ phone }: Rider, bikeId: string, clubId: string) =>
  phone.delete(`/api/bikes/${bikeId}/shares/${clubId}`).expect(204);

export async function lineUp({ phone }: Rider, clubId: string, query = "") {
  const response = await phone.get(`/api/clubs/${clubId}/line-up${query}`);
  expect(response.status).toBe(200);
  return lineUpResponseSchema.parse(response.body);
}

/** A club of four: its organiser, its mechanic, and two riders, one of whom shares a bike with it. */
export async function clubOfFour(server: Served) {
  const organiser = await signUpRider(server, "Olga");
  const mechanic = await signUpRider(server, "Mick");
  const owner = await signUpRider(server, "Ann");
  const member = await signUpRider(server, "Bob");
  const club = await makeClub(organiser);
  const invited = await invite(organiser, club.id, { uses: 10 });
  for (const rider of [mechanic, owner, member]) await join(rider, invited.token);
  await giveRoles(organiser, club.id, mechanic, { mechanic: true }).expect(200);
  const bikeId = newId();
  const log = smallLog(bikeId);
  await owner.sync(log);
  await share(owner, bikeId, club.id);
  return { organiser, mechanic, owner, member, club, invited, bikeId, log };
}

export type ClubOfFour = Awaited<ReturnType<typeof clubOfFour>>;
