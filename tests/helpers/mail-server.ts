import { once } from "node:events";
import type { AddressInfo } from "node:net";
import { text } from "node:stream/consumers";
import { SMTPServer } from "smtp-server";
import { onTestFinished } from "vitest";

export interface ReceivedLetter {
  to: string[];
  /** As it came over the line. */
  raw: string;
  /** By lower-case name. */
  headers: Record<string, string>;
  /** The plain text, and the page. */
  text: string;
  html: string;
  /** The plain text in one line. */
  words: string;
}

const decoded = (part: string) => {
  const [head = "", ...rest] = part.split("\r\n\r\n");
  const body = rest.join("\r\n\r\n");
  if (!/quoted-printable/i.test(head)) return body;
  const bytes = body
    .replace(/=\r\n/g, "")
    .replace(/=([\dA-F]{2})/g, (_, hex: string) => String.fromCharCode(parseInt(hex, 16)));
  return Buffer.from(bytes, "latin1").toString("utf8");
};

function readLetter(to: string[], raw: string): ReceivedLetter {
  const head = (raw.split("\r\n\r\n")[0] ?? "").replace(/\r\n[ \t]+/g, " ");
  const headers = Object.fromEntries(
    head
      .split("\r\n")
      .map((line) => [
        line.slice(0, line.indexOf(":")).toLowerCase(),
        line.slice(line.indexOf(":") + 1).trim(),
      ]),
  );
  const boundary = /boundary="([^"]+)"/.exec(head)?.[1];
  const parts = boundary ? raw.split(`--${boundary}`) : [];
  const partOf = (type: string) =>
    decoded(parts.find((part) => part.includes(`Content-Type: ${type}`)) ?? "");
  const plain = partOf("text/plain");
  const words = plain.replace(/\s+/g, " ");
  return { to, raw, headers, text: plain, html: partOf("text/html"), words };
}

/** A real mail server on loopback, and what it is sent. While it is `busy` it takes nothing. */
export async function startMailServer() {
  const letters: ReceivedLetter[] = [];
  const state = { busy: false };
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS"],
    onMailFrom: (_address, _session, done) =>
      done(state.busy ? Object.assign(new Error("Try later"), { responseCode: 451 }) : undefined),
    onData(stream, { envelope }, done) {
      const to = envelope.rcptTo.map(({ address }) => address);
      void text(stream).then((raw) => {
        letters.push(readLetter(to, raw));
        done();
      });
    },
  });
  server.listen(0, "127.0.0.1");
  await once(server.server, "listening");
  onTestFinished(() => new Promise<void>((resolve) => server.close(() => resolve())));
  const { port } = server.server.address() as AddressInfo;
  const about = (subject: string) =>
    letters.filter(({ headers }) => headers.subject?.includes(subject));
  return { letters, about, state, smtpUrl: `smtp://127.0.0.1:${port}` };
}

/** The path and query of the first link to a page in a letter. */
export function linkIn({ text }: ReceivedLetter, page: string): string {
  const link = text.split(/\s+/).find((word) => word.includes(page));
  if (!link) throw new Error(`There is no link to ${page} in:\n${text}`);
  const { pathname, search, hash } = new URL(link);
  return pathname + search + hash;
}
