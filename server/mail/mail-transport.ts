import { randomUUID } from "node:crypto";
import { mkdir, rename, writeFile } from "node:fs/promises";
import path from "node:path";
import nodemailer from "nodemailer";
import type { Message } from "./messages.ts";

export type SendMail = (to: string, message: Message) => Promise<void>;

/** Plain text goes out as it is: quoted-printable would break the links in it over lines. */
const asSent = (from: string, to: string, { subject, text, html }: Message) => ({
  from,
  to,
  subject,
  text: { content: text, contentTransferEncoding: "7bit" as const },
  html,
});

/** To a mail server. */
export function smtpTransport(smtpUrl: string, from: string): SendMail {
  const transport = nodemailer.createTransport(smtpUrl);
  return async (to, message) => {
    await transport.sendMail(asSent(from, to, message));
  };
}

/** To `.eml` files, where no mail server is set up. A file bears that name once it is whole. */
export function fileTransport(folder: string, from: string): SendMail {
  const transport = nodemailer.createTransport({ streamTransport: true, buffer: true });
  return async (to, message) => {
    const sent = await transport.sendMail(asSent(from, to, message));
    const file = path.join(folder, `${Date.now()}-${randomUUID()}.eml`);
    await mkdir(folder, { recursive: true });
    await writeFile(`${file}.part`, sent.message as Buffer, { mode: 0o600 });
    await rename(`${file}.part`, file);
  };
}
