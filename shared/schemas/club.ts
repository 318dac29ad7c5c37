/**
 * Clubs: who is in them, who may see which bike, and the Line-up of what is shared.
 *
 * | call | who | answers |
 * |---|---|---|
 * | `GET /api/clubs` | anyone signed in | `clubsResponseSchema` |
 * | `POST /api/clubs` `newClubSchema` | anyone signed in: becomes its organiser | 201 `clubResponseSchema` |
 * | `GET /api/clubs/:clubId` | member | `clubResponseSchema` |
 * | `DELETE /api/clubs/:clubId` | organiser: closes it for everyone | 204 |
 * | `GET /api/clubs/:clubId/members` | member | `membersResponseSchema` |
 * | `PUT /api/clubs/:clubId/members/:userId` `memberRolesSchema` | organiser | `memberResponseSchema`; 409 the last organiser |
 * | `DELETE /api/clubs/:clubId/members/:userId` | organiser, or oneself | 204; 409 the last organiser |
 * | `GET /api/clubs/:clubId/invites` | organiser | `invitesResponseSchema`: those still good |
 * | `POST /api/clubs/:clubId/invites` `newInviteSchema` | organiser | 201 `newInviteResponseSchema` |
 * | `DELETE /api/clubs/:clubId/invites/:inviteId` | organiser | 204 |
 * | `GET /api/invites/:token` | anyone, also signed out | `inviteOfTokenSchema` |
 * | `POST /api/invites/:token/accept` | anyone signed in | `clubResponseSchema` |
 * | `GET /api/clubs/:clubId/line-up?after=&limit=` | mechanic; heeds If-None-Match | `lineUpResponseSchema` |
 * | `GET /api/bikes/:bikeId/shares` | the bike's owner | `sharesResponseSchema` |
 * | `PUT`, `DELETE /api/bikes/:bikeId/shares/:clubId` | the bike's owner, to share: as a member | 204 |
 *
 * Whoever may not: 404, in the same words as where there is nothing.
 */
import { z } from "zod";
import { actions, verdicts } from "./entry.ts";

export const newClubSchema = z.strictObject({
  name: z
    .string("Give the club a name.")
    .max(80, "At most 80 characters.")
    .regex(/\S/, "Give the club a name."),
});

/** A club as one of its members sees it, with that member's own roles. */
export const clubSchema = z.object({
  id: z.string(),
  name: z.string(),
  organiser: z.boolean(),
  mechanic: z.boolean(),
});
export const clubResponseSchema = z.object({ club: clubSchema });
export const clubsResponseSchema = z.object({ clubs: z.array(clubSchema) });

export const memberSchema = z.object({
  id: z.string(),
  name: z.string(),
  organiser: z.boolean(),
  mechanic: z.boolean(),
  joinedAt: z.string(),
});
/** Organisers see every member; others themselves, the organisers and the mechanics. */
export const membersResponseSchema = z.object({ members: z.array(memberSchema) });
export const memberResponseSchema = z.object({ member: memberSchema });
export const memberRolesSchema = z.strictObject({
  organiser: z.boolean().optional(),
  mechanic: z.boolean().optional(),
});

export const MAX_INVITE_USES = 500;
export const MAX_INVITE_DAYS = 90;

export const newInviteSchema = z.strictObject({
  /** Sends the link there too, if the organiser's own address is confirmed. */
  email: z.email("This does not look like an e-mail address.").max(254).optional(),
  uses: z
    .int("How many may join must be a whole number.")
    .min(1, "At least one may join.")
    .max(MAX_INVITE_USES, `At most ${MAX_INVITE_USES} may join by one link.`)
    .default(1),
  days: z
    .int("Days must be a whole number.")
    .min(1, "At least one day.")
    .max(MAX_INVITE_DAYS, `At most ${MAX_INVITE_DAYS} days.`)
    .default(14),
});
export const inviteSchema = z.object({
  id: z.string(),
  /** Where it was mailed to; null where it was not. */
  email: z.string().nullable(),
  usesLeft: z.int(),
  createdAt: z.string(),
  expiresAt: z.string(),
});
/** The link is told once, when the invite is made: only its hash is kept. */
export const newInviteResponseSchema = z.object({ invite: inviteSchema, url: z.string() });
export const invitesResponseSchema = z.object({ invites: z.array(inviteSchema) });
export const inviteOfTokenSchema = z.object({
  club: z.object({ id: z.string(), name: z.string() }),
});

/** Who may see a bike: a club it is shared with, and the names of the club's other mechanics. */
export const shareSchema = z.object({
  club: z.object({ id: z.string(), name: z.string() }),
  since: z.string(),
  mechanics: z.array(z.string()),
});
export const sharesResponseSchema = z.object({ shares: z.array(shareSchema) });

/**
 * The Line-up's places, worst first: what puts a bike where it stands. Within a place, the bike
 * with the fewest hours left comes first.
 */
export const lineUpOrder = [
  /** The check's action, or advice written by hand that nothing has lifted. */
  "stop",
  "repeat",
  "overdue",
  "dropping",
  "due-soon",
  /** No verdict yet: no check, or a baseline that settles. */
  "settling",
  "holding",
  "retired",
] as const;
/** So many engine hours before a check falls due it is due soon. */
export const DUE_SOON_HOURS = 5;

export const MAX_LINE_UP_PAGE = 200;
/** The query of a Line-up: its numbers come as text. */
export const lineUpPageSchema = z.object({
  after: z.string("This is no place on the Line-up.").max(200).optional(),
  limit: z.coerce
    .number("How many bikes must be a whole number.")
    .int("How many bikes must be a whole number.")
    .min(1, "At least one bike.")
    .max(MAX_LINE_UP_PAGE, `At most ${MAX_LINE_UP_PAGE} bikes at a time.`)
    .default(50),
});

/**
 * What a Line-up shows of a bike, whoever owns it: phone and server make it alike from the log.
 * Hours are lifetime engine hours; fractions are of the baseline.
 */
export const lineUpFactsSchema = z.object({
  bikeId: z.string(),
  name: z.string(),
  /** The short tag shown on the bike's page, to type on a test day. */
  tag: z.string(),
  place: z.enum(lineUpOrder),
  action: z.enum(actions).nullable(),
  verdict: z.enum(verdicts),
  ratio: z.number().nullable(),
  /** Change of the ratio per engine hour; null where no trend is known. */
  trendPerHour: z.number().nullable(),
  hoursNow: z.number().nullable(),
  dueInHours: z.number(),
  onDate: z.string().nullable(),
  lastCheckAt: z.string().nullable(),
  /** Hours since the pump was last renewed; null where the log knows of no renewal. */
  pumpHours: z.number().nullable(),
  limitsTightened: z.boolean(),
  lowCheckStruck: z.boolean(),
  /** A *stop* written by hand that nothing has lifted yet. */
  stopAdvised: z.boolean(),
  hoseMaybeOff: z.boolean(),
});

/** A bike on the Line-up. */
export const lineUpRowSchema = lineUpFactsSchema.extend({
  owner: z.object({ id: z.string(), name: z.string() }),
});
export const lineUpResponseSchema = z.object({
  bikes: z.array(lineUpRowSchema),
  /** Ask again with `after` set to this for more; null at the end. */
  next: z.string().nullable(),
});

export type Club = z.infer<typeof clubSchema>;
export type Member = z.infer<typeof memberSchema>;
export type MemberRoles = z.infer<typeof memberRolesSchema>;
export type NewInvite = z.infer<typeof newInviteSchema>;
export type NewInviteResponse = z.infer<typeof newInviteResponseSchema>;
export type Invite = z.infer<typeof inviteSchema>;
export type Share = z.infer<typeof shareSchema>;
export type LineUpPage = z.infer<typeof lineUpPageSchema>;
export type LineUpPlace = (typeof lineUpOrder)[number];
export type LineUpFacts = z.infer<typeof lineUpFactsSchema>;
export type LineUpRow = z.infer<typeof lineUpRowSchema>;
