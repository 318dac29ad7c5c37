import { createHash } from "node:crypto";

/** Tokens are random, so that a fast hash hides them as well as a slow one would. */
export const hashToken = (token: string) => createHash("sha256").update(token).digest("base64url");
