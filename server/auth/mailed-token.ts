import { randomBytes } from "node:crypto";
import { minutesToMilliseconds } from "date-fns";
import type { TokenPurpose, TokenRow } from "../db/mailed-tokens.ts";
import type { Store } from "../db/store.ts";
import { hashToken } from "./hash-token.ts";

const lifetimeMinutes: Record<TokenPurpose, number> = {
  "verify-email": 7 * 24 * 60,
  "change-email": 24 * 60,
  "reset-password": 30,
};

/** More unused links of a kind than this are not sent to one account. */
const MAX_LIVE_TOKENS = 5;

/** Tokens for links in mails: kept as hashes, good once, and for a limited time. */
export function createMailedTokenService({ mailedTokens, write }: Store) {
  /** What a token is good for, its use left to it; null where it is not good. */
  function find(token: string, purposes: TokenPurpose[]): TokenRow | null {
    const row = mailedTokens.find(hashToken(token));
    return row && purposes.includes(row.purpose) && row.expiresAt > Date.now() ? row : null;
  }

  return {
    find,
    /**
     * A token and until when it is good (ms since 1970); null where the account has enough unused
     * ones. `email` is the address it goes to where that is not the account's own.
     */
    issue(userId: string, purpose: TokenPurpose, email: string | null = null) {
      const now = Date.now();
      mailedTokens.removeExpired(now);
      if (mailedTokens.countLive(userId, purpose, now) >= MAX_LIVE_TOKENS) return null;
      const token = randomBytes(16).toString("base64url");
      const goodUntil = now + minutesToMilliseconds(lifetimeMinutes[purpose]);
      mailedTokens.add({ hash: hashToken(token), userId, purpose, email, expiresAt: goodUntil });
      return { token, goodUntil };
    },
    /** Uses a token up, and with it the account's others of its kind. */
    redeem: (token: string, purposes: TokenPurpose[]): TokenRow | null =>
      write(() => {
        const row = find(token, purposes);
        if (row) mailedTokens.removeOf(row.userId, [row.purpose]);
        return row;
      }),
  };
}

export type MailedTokenService = ReturnType<typeof createMailedTokenService>;
