import path from "node:path";
import type { Config } from "../config.ts";
import type { Logger } from "../log.ts";
import { fileTransport, smtpTransport } from "./mail-transport.ts";
import type { Message } from "./messages.ts";

/**
 * Sends mail behind the requests' backs: how long an answer takes must not tell whether anything
 * was sent, and a mail server that is down stops nobody from signing up.
 */
export function createMailer(config: Config, log: Logger) {
  const sendMail = config.smtpUrl
    ? smtpTransport(config.smtpUrl, config.mailFrom)
    : fileTransport(path.join(config.dataDir, "mail"), config.mailFrom);
  const underWay = new Set<Promise<void>>();

  return {
    send(to: string, message: Message): void {
      const sending = sendMail(to, message)
        // The error's own text may hold the address.
        .catch((error: Error & { code?: string }) =>
          log.error({ code: error.code ?? error.name, subject: message.subject }, "mail not sent"),
        )
        .finally(() => underWay.delete(sending));
      underWay.add(sending);
    },
    /** Resolves once nothing is under way. */
    settled: async () => {
      await Promise.all(underWay);
    },
  };
}

export type Mailer = ReturnType<typeof createMailer>;
