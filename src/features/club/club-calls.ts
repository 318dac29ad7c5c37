/** The calls to `/api/clubs` and `/api/invites`. */
import {
  clubResponseSchema,
  inviteOfTokenSchema,
  invitesResponseSchema,
  membersResponseSchema,
  newClubSchema,
  newInviteResponseSchema,
  newInviteSchema,
  type MemberRoles,
} from "../../../shared/schemas/club.ts";
import { errorsByField } from "../../../shared/schemas/errors-by-field.ts";
import { apiRequest } from "../../offline/index.ts";
import { FieldErrors } from "../../ui/use-submit.ts";

const clubApi = (clubId: string) => `/api/clubs/${clubId}`;

export async function makeClub(name: string) {
  const typed = newClubSchema.safeParse({ name: name.trim() });
  if (!typed.success) throw new FieldErrors(errorsByField(typed.error));
  const schema = clubResponseSchema;
  return (await apiRequest("/api/clubs", { method: "POST", body: typed.data, schema })).club;
}

export const closeClub = (clubId: string) => apiRequest(clubApi(clubId), { method: "DELETE" });

export const readMembers = async (clubId: string) =>
  (await apiRequest(`${clubApi(clubId)}/members`, { schema: membersResponseSchema })).members;

export const giveRoles = (clubId: string, userId: string, roles: MemberRoles) =>
  apiRequest(`${clubApi(clubId)}/members/${userId}`, { method: "PUT", body: roles });

/** Also how one leaves a club. */
export const removeMember = (clubId: string, userId: string) =>
  apiRequest(`${clubApi(clubId)}/members/${userId}`, { method: "DELETE" });

export const readInvites = async (clubId: string) =>
  (await apiRequest(`${clubApi(clubId)}/invites`, { schema: invitesResponseSchema })).invites;

export async function makeInvite(
  clubId: string,
  wanted: { email?: string; uses: number; days: number },
) {
  const typed = newInviteSchema.safeParse(wanted);
  if (!typed.success) throw new FieldErrors(errorsByField(typed.error));
  const request = { method: "POST", body: typed.data, schema: newInviteResponseSchema } as const;
  return apiRequest(`${clubApi(clubId)}/invites`, request);
}

export const revokeInvite = (clubId: string, inviteId: string) =>
  apiRequest(`${clubApi(clubId)}/invites/${inviteId}`, { method: "DELETE" });

const inviteApi = (token: string) => `/api/invites/${encodeURIComponent(token)}`;

export const readInvitation = async (token: string) =>
  (await apiRequest(inviteApi(token), { schema: inviteOfTokenSchema })).club;

export const acceptInvitation = async (token: string) =>
  (await apiRequest(`${inviteApi(token)}/accept`, { method: "POST", schema: clubResponseSchema }))
    .club;
