export interface Message {
  subject: string;
  text: string;
  html: string;
}

interface Letter {
  subject: string;
  opening: string;
  link: string;
  linkText: string;
  closing: string;
}

// Letters hold nothing that a stranger could have typed into the sign-up form. They are ASCII in
// lines of at most 76 characters, so that they travel as they are written, links in one piece.
const page = ({ subject, opening, link, linkText, closing }: Letter) => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<title>${subject}</title>
<style>
body { margin: 0; padding: 24px; background: #f7f4ec; color: #1c1a17 }
div { max-width: 32em; margin: 0 auto; font: 18px/1.5 sans-serif }
.do { display: inline-block; padding: 14px 22px; background: #1c1a17 }
a.do { color: #f7f4ec }
</style>
</head>
<body>
<div>
<p>${opening}</p>
<p>
<a class="do"
href="${link}">
${linkText}</a>
</p>
<p>${closing}</p>
<p>Sumpless</p>
</div>
</body>
</html>
`;

const message = (letter: Letter): Message => ({
  subject: letter.subject,
  text: `${letter.opening}\n\n${letter.link}\n\n${letter.closing}\n\nSumpless\n`,
  html: page(letter),
});

/** A page of the client that takes the token from its address. */
const linkTo = (publicOrigin: string, page: string, token: string) =>
  `${publicOrigin}/${page}?token=${token}`;

export const verificationMessage = (publicOrigin: string, token: string): Message =>
  message({
    subject: "Confirm your e-mail address for Sumpless",
    opening: "Please confirm that this address is yours, so that reminders may be\nsent here.",
    link: linkTo(publicOrigin, "verify", token),
    linkText: "Confirm this address",
    closing:
      "The link works once, for seven days.\n" +
      "If you have no account with Sumpless, you need do nothing.",
  });

export const passwordResetMessage = (publicOrigin: string, token: string): Message =>
  message({
    subject: "Choose a new password for Sumpless",
    opening: "Someone, we hope you, asked for a new password for your account with\nSumpless.",
    link: linkTo(publicOrigin, "reset", token),
    linkText: "Choose a new password",
    closing:
      "The link works once, for 30 minutes. Every phone is then asked to sign\nin again.\n" +
      "If it was not you, your password stays as it is and you need do\nnothing.",
  });
