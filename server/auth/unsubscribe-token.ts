import { createHmac, timingSafeEqual } from "node:crypto";
import type { Reminders } from "../../shared/schemas/reminders.ts";

/** Which mails a link ends; a mail names its kind by its place here. */
const kinds: (keyof Reminders)[] = ["dueMails", "stopMails"];
const MAC_BYTES = 12;

const macOf = (secret: Buffer, content: Buffer) =>
  createHmac("sha256", secret).update(content).digest().subarray(0, MAC_BYTES);

/**
 * A token that ends one kind of mail to one account, for as long as the account is there. It is
 * signed and not kept: every mail has one, and all that a forged one could do is to end a mail.
 */
export function unsubscribeToken(secret: Buffer, userId: string, kind: keyof Reminders): string {
  const id = Buffer.from(userId.replaceAll("-", ""), "hex");
  const content = Buffer.concat([Buffer.from([kinds.indexOf(kind)]), id]);
  return Buffer.concat([content, macOf(secret, content)]).toString("base64url");
}

/** Null for a token that is none of ours. */
export function readUnsubscribeToken(secret: Buffer, token: string) {
  const bytes = Buffer.from(token, "base64url");
  const content = bytes.subarray(0, -MAC_BYTES);
  const mac = bytes.subarray(-MAC_BYTES);
  const kind = kinds[content[0] ?? kinds.length];
  const good = mac.length === MAC_BYTES && timingSafeEqual(mac, macOf(secret, content));
  if (!good || kind === undefined) return null;
  const userId = content
    .subarray(1)
    .toString("hex")
    .replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, "$1-$2-$3-$4-$5");
  return { userId, kind };
}
