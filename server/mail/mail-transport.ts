import { mkdir, rename, writeFile } from "node:fs/promises";
import path from "node:path";
import nodemailer from "nodemailer";
import type { Letter } from "./letter.ts";

export type SendLetter = (letter: Letter) => Promise<void>;

/** To a mail server. */
export function smtpTransport(smtpUrl: string, from: string): SendLetter {
  const transport = nodemailer.createTransport(smtpUrl);
  return async ({ to, messageId, message }) => {
    await transport.sendMail({ from, to, messageId, ...message });
  };
}

/** A file bears its name once it is whole. */
async function writeWhole(file: string, content: Buffer | string): Promise<void> {
  await writeFile(`${file}.part`, content, { mode: 0o600 });
  await rename(`${file}.part`, file);
}

/**
 * To files, where no mail server is set up: an `.eml` that any mail program opens, and beside it
 * the letter itself for the page that shows what would have been sent. Both are named for the
 * letter's id, so that one sent twice is there once.
 */
export function fileTransport(folder: string, from: string): SendLetter {
  const transport = nodemailer.createTransport({ streamTransport: true, buffer: true });
  return async (letter) => {
    const { to, messageId, message } = letter;
    const sent = await transport.sendMail({ from, to, messageId, ...message });
    const file = path.join(folder, messageId.replace(/^<|@.*$/g, ""));
    await mkdir(folder, { recursive: true });
    await writeWhole(`${file}.json`, JSON.stringify(letter));
    await writeWhole(`${file}.eml`, sent.message as Buffer);
  };
}
