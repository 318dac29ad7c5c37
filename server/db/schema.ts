import { sql } from "drizzle-orm";
import {
  index,
  integer,
  primaryKey,
  real,
  sqliteTable,
  text,
  uniqueIndex,
} from "drizzle-orm/sqlite-core";
import type { LineUpFacts } from "../../shared/schemas/club.ts";
import type { Action, Verdict } from "../../shared/schemas/entry.ts";
import type { Summary } from "../../shared/schemas/summary.ts";
import type { Letter } from "../mail/letter.ts";

// Nothing is deleted by cascade: a table rebuild in a migration would take the children along.

export const users = sqliteTable(
  "users",
  {
    id: text().primaryKey(),
    /** As it was typed; told apart without regard to case. */
    email: text().notNull(),
    name: text().notNull(),
    passwordHash: text().notNull(),
    verified: integer({ mode: "boolean" }).notNull(),
    createdAt: text().notNull(),
  },
  (table) => [uniqueIndex("users_email").on(sql`lower(${table.email})`)],
);

export const sessions = sqliteTable(
  "sessions",
  {
    /** The hash of the cookie's value: a copy of the database signs nobody in. */
    id: text().primaryKey(),
    userId: text()
      .notNull()
      .references(() => users.id),
    /** Seconds since 1970. */
    expiresAt: integer().notNull(),
    signedInAt: text().notNull().default(""),
    /** To the hour. */
    seenAt: text().notNull().default(""),
    /** Which browser on which system, and nothing finer; never an address. */
    device: text().notNull().default(""),
  },
  (table) => [index("sessions_user").on(table.userId)],
);

export const tokenPurposes = ["verify-email", "change-email", "reset-password"] as const;

/** Tokens sent by mail, each good for one use. */
export const mailedTokens = sqliteTable(
  "mailed_tokens",
  {
    hash: text().primaryKey(),
    userId: text()
      .notNull()
      .references(() => users.id),
    purpose: text({ enum: tokenPurposes }).notNull(),
    /** The address it was sent to, where that is not the account's yet. */
    email: text(),
    /** Milliseconds since 1970. */
    expiresAt: integer().notNull(),
  },
  (table) => [index("mailed_tokens_user").on(table.userId)],
);

export const bikes = sqliteTable(
  "bikes",
  {
    id: text().primaryKey(),
    ownerId: text()
      .notNull()
      .references(() => users.id),
  },
  (table) => [index("bikes_owner").on(table.ownerId)],
);

/**
 * Append only: rows are added, and leave only when their whole bike is erased. They get another
 * `rev` when their author's account is.
 */
export const entries = sqliteTable(
  "entries",
  {
    /** One counter for the database: in commit order, never reused. */
    rev: integer().primaryKey({ autoIncrement: true }),
    id: text().notNull().unique(),
    bikeId: text()
      .notNull()
      .references(() => bikes.id),
    kind: text().notNull(),
    v: integer().notNull(),
    at: text().notNull(),
    hours: real(),
    body: text({ mode: "json" }).$type<Record<string, unknown>>().notNull(),
    /** No reference: what a mechanic wrote on another's bike outlives the mechanic's account. */
    authorId: text().notNull(),
    receivedAt: text().notNull(),
  },
  (table) => [index("entries_bike_rev").on(table.bikeId, table.rev)],
);

/** What `summariseLogbook` says of each bike, and the columns that lists sort and filter by. */
export const bikeSummaries = sqliteTable("bike_summaries", {
  bikeId: text()
    .primaryKey()
    .references(() => bikes.id),
  name: text().notNull(),
  retired: integer({ mode: "boolean" }).notNull(),
  verdict: text().$type<Verdict>().notNull(),
  action: text().$type<Action>(),
  pLow: real(),
  hoursNow: real(),
  dueInHours: real(),
  lastCheckAt: text(),
  summary: text({ mode: "json" }).$type<Summary>().notNull(),
});

/**
 * What a Line-up shows of each bike and reminders go by: apart from the summary, which grows with
 * the log and would have to be read past.
 */
export const lineUpFacts = sqliteTable(
  "line_up_facts",
  {
    bikeId: text()
      .primaryKey()
      .references(() => bikes.id),
    /** The index of its place in `lineUpOrder`. */
    rank: integer().notNull(),
    dueInHours: real().notNull(),
    /** YYYY-MM-DD; null where the hours a week are not known. */
    dueOn: text(),
    facts: text({ mode: "json" }).$type<LineUpFacts>().notNull(),
  },
  (table) => [
    index("line_up_facts_due_hours").on(table.dueInHours),
    index("line_up_facts_due_on").on(table.dueOn),
  ],
);

export const clubs = sqliteTable("clubs", {
  id: text().primaryKey(),
  name: text().notNull(),
  createdAt: text().notNull(),
  /** Goes up whenever the club's Line-up changes, in the transaction that changes it. */
  revision: integer().notNull().default(0),
});

const clubId = () =>
  text()
    .notNull()
    .references(() => clubs.id);

export const clubMembers = sqliteTable(
  "club_members",
  {
    clubId: clubId(),
    userId: text()
      .notNull()
      .references(() => users.id),
    organiser: integer({ mode: "boolean" }).notNull(),
    mechanic: integer({ mode: "boolean" }).notNull(),
    joinedAt: text().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.clubId, table.userId] }),
    index("club_members_user").on(table.userId),
  ],
);

export const clubInvites = sqliteTable(
  "club_invites",
  {
    id: text().primaryKey(),
    clubId: clubId(),
    /** Of the link's token, which is told once and not kept. */
    hash: text().notNull().unique(),
    /** Where the link was sent too; null where it was handed over in another way. */
    email: text(),
    usesLeft: integer().notNull(),
    createdAt: text().notNull(),
    expiresAt: text().notNull(),
  },
  (table) => [index("club_invites_club").on(table.clubId)],
);

/**
 * The bikes on each club's Line-up. Rank and hours are copies of the bike's facts, kept in step with
 * them, so that a page of the board is read off one index, worst first.
 */
export const bikeShares = sqliteTable(
  "bike_shares",
  {
    bikeId: text()
      .notNull()
      .references(() => bikes.id),
    clubId: clubId(),
    sharedAt: text().notNull(),
    rank: integer().notNull(),
    dueInHours: real().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.bikeId, table.clubId] }),
    index("bike_shares_line_up").on(table.clubId, table.rank, table.dueInHours, table.bikeId),
  ],
);

/** Which mails an account gets; one without a row gets them all. */
export const reminders = sqliteTable("reminders", {
  userId: text()
    .primaryKey()
    .references(() => users.id),
  dueMails: integer({ mode: "boolean" }).notNull(),
  stopMails: integer({ mode: "boolean" }).notNull(),
});

export const mailTopics = [
  "verify-email",
  "change-email",
  "reset-password",
  "account-news",
  "invitation",
  "due",
  "stop",
  "stop-advice",
] as const;

/**
 * Every mail, written in the transaction that causes it, and kept after it was sent, without its
 * text and address, so that none is sent twice about the same thing.
 */
export const mails = sqliteTable(
  "mails",
  {
    id: integer().primaryKey({ autoIncrement: true }),
    topic: text({ enum: mailTopics }).notNull(),
    /** The account it goes to; null for an invitation, which goes to an address alone. */
    userId: text().references(() => users.id),
    bikeId: text().references(() => bikes.id),
    /** What it is about, once for each topic and account; null where it may be sent again. */
    occasion: text(),
    /** Null once it is sent or given up: it may hold tokens. */
    letter: text({ mode: "json" }).$type<Letter>(),
    queuedAt: text().notNull(),
    attempts: integer().notNull().default(0),
    /** Milliseconds since 1970; null once there is nothing left to try. */
    nextAttemptAt: integer(),
    /** Milliseconds since 1970: after this it is of no use to anyone. */
    goodUntil: integer().notNull(),
    sentAt: text(),
  },
  (table) => [
    uniqueIndex("mails_occasion").on(table.userId, table.topic, table.occasion),
    index("mails_bike").on(table.bikeId, table.topic, table.queuedAt),
    index("mails_next").on(table.nextAttemptAt),
  ],
);

/** Ids of bikes, entries and accounts that were erased, so that no phone brings them back. */
export const erasedIds = sqliteTable("erased_ids", { id: text().primaryKey() });

export const meta = sqliteTable("meta", { key: text().primaryKey(), value: text().notNull() });
