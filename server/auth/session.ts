import { DrizzleSQLiteAdapter } from "@lucia-auth/adapter-drizzle";
import { generateIdFromEntropySize, Lucia, TimeSpan } from "lucia";
import type { Database } from "../db/open-database.ts";
import { sessions, users } from "../db/schema.ts";
import { hashToken } from "./hash-token.ts";

/** Counted from the last visit: a rider who checks the pump twice a season stays signed in. */
const SESSION_LENGTH = new TimeSpan(90, "d");

export interface CurrentSession {
  userId: string;
  /** Set where the session's end has moved: the cookie to send again. */
  renewedCookie: string | null;
}

/**
 * Sessions, by Lucia 3, which nothing else knows of: upstream it is frozen, so that it can be
 * replaced here alone. Lucia stores the ids it is given; it is given hashes of the cookie's value.
 */
export function createSessions(db: Database, publicOrigin: string) {
  const secure = publicOrigin.startsWith("https:");
  const lucia = new Lucia(new DrizzleSQLiteAdapter(db, sessions, users), {
    sessionExpiresIn: SESSION_LENGTH,
    sessionCookie: {
      name: secure ? "__Host-session" : "session",
      attributes: { secure, sameSite: "lax", path: "/" },
    },
  });
  const cookieFor = (token: string) => lucia.createSessionCookie(token).serialize();

  /** Null also for a cookie that cannot be decoded: it is none of ours. */
  function readToken(cookieHeader: string | undefined): string | null {
    try {
      return lucia.readSessionCookie(cookieHeader ?? "");
    } catch {
      return null;
    }
  }

  return {
    /** Answers the cookie to send. */
    async begin(userId: string): Promise<string> {
      await lucia.deleteExpiredSessions();
      const token = generateIdFromEntropySize(25);
      await lucia.createSession(userId, {}, { sessionId: hashToken(token) });
      return cookieFor(token);
    },
    async read(cookieHeader: string | undefined): Promise<CurrentSession | null> {
      const token = readToken(cookieHeader);
      if (!token) return null;
      const { session } = await lucia.validateSession(hashToken(token));
      if (!session) return null;
      return { userId: session.userId, renewedCookie: session.fresh ? cookieFor(token) : null };
    },
    /** Answers the cookie that clears the last one. */
    async end(cookieHeader: string | undefined): Promise<string> {
      const token = readToken(cookieHeader);
      if (token) await lucia.invalidateSession(hashToken(token));
      return lucia.createBlankSessionCookie().serialize();
    },
    endAllOf: (userId: string) => lucia.invalidateUserSessions(userId),
  };
}

export type Sessions = ReturnType<typeof createSessions>;
