import { sql } from "drizzle-orm";
import { index, integer, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Action, Verdict } from "../../shared/schemas/entry.ts";
import type { Summary } from "../../shared/schemas/summary.ts";

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
  },
  (table) => [index("sessions_user").on(table.userId)],
);

export const tokenPurposes = ["verify-email", "reset-password"] as const;

/** Tokens sent by mail, each good for one use. */
export const mailedTokens = sqliteTable(
  "mailed_tokens",
  {
    hash: text().primaryKey(),
    userId: text()
      .notNull()
      .references(() => users.id),
    purpose: text({ enum: tokenPurposes }).notNull(),
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

/** Append only: rows are added, and leave only when their whole bike is erased. */
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

/** What `summariseLogbook` says of each bike, and the columns that boards sort and filter by. */
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

/** Ids of bikes, entries and accounts that were erased, so that no phone brings them back. */
export const erasedIds = sqliteTable("erased_ids", { id: text().primaryKey() });

export const meta = sqliteTable("meta", { key: text().primaryKey(), value: text().notNull() });
