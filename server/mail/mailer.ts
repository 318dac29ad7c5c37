import { minutesToMilliseconds } from "date-fns";
import { randomUUID } from "node:crypto";
import path from "node:path";
import type { Config } from "../config.ts";
import type { MailTopic, WaitingMail } from "../db/mails.ts";
import type { Store } from "../db/store.ts";
import type { Logger } from "../log.ts";
import { fileTransport, smtpTransport } from "./mail-transport.ts";
import type { Message } from "./letter.ts";

/** So many letters are on their way at once. */
const AT_ONCE = 5;
/** A minute after the first failure, twice as long after each further one, at most four hours. */
const FIRST_WAIT_MS = minutesToMilliseconds(1);
const LONGEST_WAIT_MS = minutesToMilliseconds(240);

export interface NewMail {
  topic: MailTopic;
  to: string;
  message: Message;
  /** Milliseconds since 1970: after this it is of no use to anyone. */
  goodUntil: number;
  userId?: string;
  bikeId?: string;
  /** What it is about, where an account is to be told of it once. */
  occasion?: string;
}

const waitMs = (attempts: number) => Math.min(FIRST_WAIT_MS * 2 ** (attempts - 1), LONGEST_WAIT_MS);

/** Where mail goes when no mail server is set up. */
export const mailFolder = (dataDir: string) => path.join(dataDir, "mail");

/**
 * Sends mail behind the requests' backs: how long an answer takes must not tell whether anything
 * was sent, and a mail server that is down stops nobody from signing up. What is to be sent stands
 * in the database first, in the transaction that causes it, and is tried until it is sent or of no
 * use any more, by this life of the server or the next. One whose sending was cut off by a crash
 * goes out again under the same Message-ID, by which mail programs know it. Where it goes, `addressFor`
 * says as it is sent; null stands for nowhere.
 */
export function createMailer(
  { mails }: Pick<Store, "mails">,
  config: Config,
  log: Logger,
  addressFor: (mail: WaitingMail) => string | null,
) {
  const sendLetter = config.smtpUrl
    ? smtpTransport(config.smtpUrl, config.mailFrom)
    : fileTransport(mailFolder(config.dataDir), config.mailFrom);
  const { hostname } = new URL(config.publicOrigin);
  let sending: Promise<void> | null = null;

  /** The next try is written down before this one: whatever happens, no letter goes out in a loop. */
  async function send(mail: WaitingMail): Promise<void> {
    const { id, topic, letter, goodUntil } = mail;
    const to = goodUntil < Date.now() ? null : addressFor(mail);
    if (to === null) return void mails.giveUp(id);
    const attempts = mail.attempts + 1;
    const nextAttemptAt = Date.now() + waitMs(attempts);
    mails.postpone(id, attempts, nextAttemptAt);
    try {
      await sendLetter({ ...letter, to });
    } catch (error) {
      const { code, name } = error as Error & { code?: string };
      // The error's own text may hold the address.
      log.error({ code: code ?? name, topic, attempts }, "mail not sent");
      if (nextAttemptAt > goodUntil) mails.giveUp(id);
      return;
    }
    mails.markSent(id, new Date().toISOString());
  }

  async function sendAll(): Promise<void> {
    for (;;) {
      const waiting = mails.waiting(Date.now(), AT_ONCE);
      if (waiting.length === 0) return;
      await Promise.all(waiting.map(send));
    }
  }

  /** Sends what is due, one run at a time; resolves once nothing is. */
  async function sendDue(): Promise<void> {
    while (sending) await sending;
    sending = sendAll()
      .catch((err: unknown) => log.error({ err }, "mail cannot be sent just now"))
      .finally(() => (sending = null));
    await sending;
  }

  return {
    /** Of the present transaction; the sending begins after it. */
    queue({ to, message, ...mail }: NewMail): void {
      const now = new Date();
      const messageId = `<${now.getTime()}-${randomUUID()}@${hostname}>`;
      const letter = { to, messageId, message };
      mails.add({
        ...mail,
        letter,
        queuedAt: now.toISOString(),
        nextAttemptAt: now.getTime(),
      });
      setImmediate(() => void sendDue());
    },
    sendDue,
  };
}

export type Mailer = ReturnType<typeof createMailer>;
