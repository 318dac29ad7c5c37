import { randomBytes } from "node:crypto";
import { minutesToMilliseconds } from "date-fns";
import type { TokenPurpose } from "../db/mailed-tokens.ts";
import type { Store } from "../db/store.ts";
import { hashToken } from "./hash-token.ts";

const lifetimeMinutes: Record<TokenPurpose, number> = {
  "verify-email": 7 * 24 * 60,
  "reset-password": 30,
};

/** More unused links of a kind than this are not sent to one account. */
const MAX_LIVE_TOKENS = 5;

/** Tokens for links in mails: kept as hashes, good once, and for a limited time. */
export function createMailedTokenService({ mailedTokens, write }: Store) {
  return {
    /** A token and until when it is good (ms since 1970); null where the account has enough unused ones. */
    issue(userId: string, purpose: TokenPurpose): { token: string; goodUntil: number } | null {
      const now = Date.now();
      mailedTokens.removeExpired(now);
      if (mailedTokens.countLive(userId, purpose, now) >= MAX_LIVE_TOKENS) return null;
      const token = randomBytes(16).toString("base64url");
      const goodUntil = now + minutesToMilliseconds(lifetimeMinutes[purpose]);
      mailedTokens.add({ hash: hashToken(token), userId, purpose, expiresAt: goodUntil });
      return { token, goodUntil };
    },
    /** The account a token was sent to, or null where it is not good; the account's others end too. */
    redeem: (token: string, purpose: TokenPurpose): string | null =>
      write(() => {
        const found = mailedTokens.find(hashToken(token), purpose);
        if (!found) return null;
        mailedTokens.removeOf(found.userId, purpose);
        return found.expiresAt > Date.now() ? found.userId : null;
      }),
  };
}
