import type { Store } from "../db/store.ts";
import type { Mailer } from "../mail/mailer.ts";

/** What it takes to write a mail. */
export interface MailParts {
  store: Store;
  mailer: Mailer;
  publicOrigin: string;
}
