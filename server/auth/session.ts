import { DrizzleSQLiteAdapter } from "@lucia-auth/adapter-drizzle";
import { hoursToMilliseconds } from "date-fns";
import { generateIdFromEntropySize, Lucia, TimeSpan } from "lucia";
import type { Database } from "../db/open-database.ts";
import { sessions, users } from "../db/schema.ts";
import { createSessionRows } from "../db/sessions.ts";
import { deviceName } from "./device-name.ts";
import { hashToken } from "./hash-token.ts";

/** Counted from the last visit: a rider who checks the pump twice a season stays signed in. */
const SESSION_LENGTH = new TimeSpan(90, "d");
/** When a device was last seen is written down this often at most. */
const SEEN_EVERY_MS = hoursToMilliseconds(1);

/** Since 1970, as the database has them. */
const seconds = (ms: number) => Math.floor(ms / 1000);

/** What a list of one's devices shows of a session. */
interface SessionFacts {
  signedInAt: string;
  seenAt: string;
  device: string;
}

declare module "lucia" {
  interface Register {
    Lucia: Lucia<SessionFacts>;
    DatabaseSessionAttributes: SessionFacts;
  }
}

/** The headers that say who is calling. */
export interface Caller {
  cookie?: string | undefined;
  "user-agent"?: string | undefined;
}

export interface CurrentSession {
  id: string;
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
  const rows = createSessionRows(db);
  const lucia = new Lucia(new DrizzleSQLiteAdapter(db, sessions, users), {
    sessionExpiresIn: SESSION_LENGTH,
    sessionCookie: {
      name: secure ? "__Host-session" : "session",
      attributes: { secure, sameSite: "lax", path: "/" },
    },
    getSessionAttributes: (facts) => facts,
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

  function noteVisit(id: string, seenAt: string): void {
    const now = new Date();
    const last = new Date(seenAt).getTime();
    if (!(now.getTime() - last < SEEN_EVERY_MS)) rows.markSeen(id, now.toISOString());
  }

  function end(cookieHeader: string | undefined): void {
    const token = readToken(cookieHeader);
    if (token) rows.removeAnyones(hashToken(token));
  }

  return {
    /**
     * Signs in. Whatever session the caller came with ends; the new one has an id that nobody has
     * seen. Answers the cookie to send. At once, and so not by Lucia: a transaction may hold it.
     */
    begin(userId: string, caller: Caller): string {
      end(caller.cookie);
      const now = new Date();
      rows.removeExpired(seconds(now.getTime()));
      const token = generateIdFromEntropySize(25);
      rows.add({
        id: hashToken(token),
        userId,
        expiresAt: seconds(now.getTime() + SESSION_LENGTH.milliseconds()),
        signedInAt: now.toISOString(),
        seenAt: now.toISOString(),
        device: deviceName(caller["user-agent"]),
      });
      return cookieFor(token);
    },
    async read(cookieHeader: string | undefined): Promise<CurrentSession | null> {
      const token = readToken(cookieHeader);
      if (!token) return null;
      const { session } = await lucia.validateSession(hashToken(token));
      if (!session) return null;
      const { id, userId, fresh, seenAt } = session;
      noteVisit(id, seenAt);
      return { id, userId, renewedCookie: fresh ? cookieFor(token) : null };
    },
    /** Answers the cookie that clears the last one. */
    end(cookieHeader: string | undefined): string {
      end(cookieHeader);
      return lucia.createBlankSessionCookie().serialize();
    },
    list: (userId: string) => rows.of(userId, seconds(Date.now())),
    /** False where the account has no such session. */
    endOne: (userId: string, id: string) => rows.remove(userId, id),
    endOthers: (userId: string, keptId: string) => void rows.removeOthers(userId, keptId),
    /** At once, so that a transaction may hold it. */
    endAllOf: (userId: string) => void rows.removeOf(userId),
    endAll: () => void rows.removeAll(),
  };
}

export type Sessions = ReturnType<typeof createSessions>;
