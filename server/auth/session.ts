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
interface Caller {
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

  async function end(cookieHeader: string | undefined): Promise<void> {
    const token = readToken(cookieHeader);
    if (token) await lucia.invalidateSession(hashToken(token));
  }

  return {
    /**
     * Signs in. Whatever session the caller came with ends; the new one has an id that nobody has
     * seen. Answers the cookie to send.
     */
    async begin(userId: string, caller: Caller): Promise<string> {
      await end(caller.cookie);
      await lucia.deleteExpiredSessions();
      const token = generateIdFromEntropySize(25);
      const now = new Date().toISOString();
      const facts = { signedInAt: now, seenAt: now, device: deviceName(caller["user-agent"]) };
      await lucia.createSession(userId, facts, { sessionId: hashToken(token) });
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
    async end(cookieHeader: string | undefined): Promise<string> {
      await end(cookieHeader);
      return lucia.createBlankSessionCookie().serialize();
    },
    list: (userId: string) => rows.of(userId, Math.floor(Date.now() / 1000)),
    /** False where the account has no such session. */
    endOne: (userId: string, id: string) => rows.remove(userId, id),
    endOthers: (userId: string, keptId: string) => void rows.removeOthers(userId, keptId),
    /** At once, so that a transaction may hold it. */
    endAllOf: (userId: string) => void rows.removeOf(userId),
    endAll: () => void rows.removeAll(),
  };
}

export type Sessions = ReturnType<typeof createSessions>;
