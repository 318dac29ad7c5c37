import type { Message } from "./letter.ts";

/** What a letter says; the look of it is this file's business. */
export interface Words {
  subject: string;
  /** Paragraphs before the link. */
  opening: string[];
  link: string;
  linkText: string;
  /** Paragraphs after it. */
  closing: string[];
  /** Ends mails of this kind. */
  unsubscribe?: { page: string; oneClick: string };
}

/** Short enough to travel as they are written, links apart. */
const LINE_LENGTH = 72;

function wrapped(paragraph: string): string {
  const lines: string[] = [];
  for (const word of paragraph.split(/\s+/)) {
    const longer = `${lines.at(-1)} ${word}`;
    if (lines.length > 0 && longer.length <= LINE_LENGTH) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines.join("\n");
}

export const escaped = (text: string) =>
  text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");

const inHtml = (paragraphs: string[]) =>
  paragraphs.map((paragraph) => `<p>${escaped(wrapped(paragraph))}</p>`).join("\n");

const END_THEM = "Send me no more of these";

const page = ({ subject, opening, link, linkText, closing, unsubscribe }: Words) => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<title>${escaped(subject)}</title>
<style>
body { margin: 0; padding: 24px; background: #f7f4ec; color: #1b1e20 }
div { max-width: 32em; margin: 0 auto; font: 18px/1.5 sans-serif }
.do { display: inline-block; padding: 14px 22px; border-radius: 12px }
a.do { background: #1b1e20; color: #f7f4ec }
.foot { border-top: 1px solid #d8d1c0; padding-top: 12px; font-size: 15px }
.foot a { color: #8a5a00 }
</style>
</head>
<body>
<div>
${inHtml(opening)}
<p>
<a class="do"
href="${link}">
${escaped(linkText)}</a>
</p>
${inHtml(closing)}
<p class="foot">Sumpless${unsubscribe ? `<br>\n<a\nhref="${unsubscribe.page}">\n${END_THEM}</a>` : ""}</p>
</div>
</body>
</html>
`;

function plain({ opening, link, closing, unsubscribe }: Words): string {
  const parts = [...opening.map(wrapped), link, ...closing.map(wrapped), "Sumpless"];
  if (unsubscribe) parts.push(`${END_THEM}:\n${unsubscribe.page}`);
  return `${parts.join("\n\n")}\n`;
}

/** Mails that a person did not ask for just now can be ended by one click in the mail program (RFC 8058). */
const unsubscribeHeaders = (oneClick: string) => ({
  "List-Unsubscribe": `<${oneClick}>`,
  "List-Unsubscribe-Post": "List-Unsubscribe=One-Click",
  "Auto-Submitted": "auto-generated",
});

export const compose = (words: Words): Message => ({
  subject: words.subject.replace(/\s+/g, " "),
  text: plain(words),
  html: page(words),
  ...(words.unsubscribe && { headers: unsubscribeHeaders(words.unsubscribe.oneClick) }),
});

/** A page of the client that takes the token from its address. */
export const linkTo = (publicOrigin: string, page: string, token: string) =>
  `${publicOrigin}${page}?token=${token}`;

/**
 * The same for a token that lets somebody into an account: it stands behind the `#`, which browsers
 * keep to themselves, so that no server on the way has it in its log.
 */
export const keyLinkTo = (publicOrigin: string, page: string, token: string) =>
  `${publicOrigin}${page}#token=${token}`;
