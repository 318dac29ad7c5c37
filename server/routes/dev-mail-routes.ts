import { Router, type RequestHandler } from "express";
import type { Config } from "../config.ts";
import { escaped } from "../mail/compose.ts";
import { mailFolder } from "../mail/mailer.ts";
import { notFound } from "../problems.ts";
import { readKeptLetters, type KeptLetter } from "../services/kept-letters.ts";

const line = ({ name, to, message }: KeptLetter) =>
  `<li><a href="/dev/mail/${name}">${escaped(message.subject)}</a> to ${escaped(to)}</li>`;

const page = (letters: KeptLetter[]) => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<title>Mail that was not sent</title>
<style>
body { margin: 24px; background: #f7f4ec; color: #1b1e20; font: 18px/1.6 sans-serif }
a { color: #8a5a00 }
</style>
</head>
<body>
<h1>Mail that was not sent</h1>
<p>No mail server is set up (SMTP_URL). The newest letter comes first.</p>
<ol>
${letters.map(line).join("\n")}
</ol>
</body>
</html>
`;

/** Letters hold links that let people in: they are shown on the machine that wrote them, to nobody else. */
const requireThisMachine =
  ({ publicOrigin }: Config): RequestHandler =>
  (request, _response, next) => {
    const from = request.socket.remoteAddress ?? "";
    const isHere = /^(::1|(::ffff:)?127\.\d+\.\d+\.\d+)$/.test(from);
    // Another site's name that leads here says so in Host.
    if (!isHere || request.headers.host !== new URL(publicOrigin).host) throw notFound();
    next();
  };

/** Mails bring their style along, as pages of ours may not; they may do nothing else. */
const allowMailStyle: RequestHandler = (_request, response, next) => {
  response.set({
    "Cache-Control": "no-store",
    "Content-Security-Policy":
      "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'",
  });
  next();
};

/** What would have been sent, for whoever develops. */
export function createDevMailRoutes(config: Config): Router {
  const folder = mailFolder(config.dataDir);
  const router = Router();
  router.use("/dev", requireThisMachine(config), allowMailStyle);
  router.get("/dev/mail", (_request, response) => {
    response.type("html").send(page(readKeptLetters(folder)));
  });
  router.get("/dev/mail/:name", (request, response) => {
    const letter = readKeptLetters(folder).find(({ name }) => name === request.params.name);
    if (!letter) throw notFound();
    response.type("html").send(letter.message.html);
  });
  return router;
}
