import { randomUUID } from "node:crypto";
import { mkdir, rename, writeFile } from "node:fs/promises";
import path from "node:path";
import nodemailer from "nodemailer";
import type { Message } from "./messages.ts";

export type SendMail = (to: string, message: Message) => Promise<void>;

/** To a mail server. */
export function smtpTransport(smtpUrl: string, from: string): SendMail {
  const transport = nodemailer.createTransport(smtpUrl);
  return async (to, message) => {
    await transport.sendMail({ from, to, ...message });
  };
}

/** To `.eml` files, where no mail server is set up. A file bears that name once it is whole. */
export function fileTransport(folder: string, from: string): SendMail {
  const transport = nodemailer.createTransport({ streamTransport: true, buffer: true });
  return async (to, message) => {
    const sent = await transport.sendMail({ from, to, ...message });
    const file = path.join(folder, `${Date.now()}-${randomUUID()}.eml`);
    await mkdir(folder, { recursive: true });
    await writeFile(`${file}.part`, sent.message as Buffer, { mode: 0o600 });
    await rename(`${file}.part`, file);
  };
}
