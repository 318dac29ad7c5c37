/** Letters about an account. They hold nothing that a stranger could have typed into the sign-up form. */
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import { compose, keyLinkTo } from "./compose.ts";
import type { Message } from "./letter.ts";

export const verificationMessage = (publicOrigin: string, token: string): Message =>
  compose({
    subject: "Confirm your e-mail address for Sumpless",
    opening: ["Please confirm that this address is yours, so that reminders may be sent here."],
    link: keyLinkTo(publicOrigin, mailedPages.verify, token),
    linkText: "Confirm this address",
    closing: [
      "The link works once, for seven days. If you have no account with Sumpless, you need do nothing.",
    ],
  });

export const passwordResetMessage = (publicOrigin: string, token: string): Message =>
  compose({
    subject: "Choose a new password for Sumpless",
    opening: ["Someone, we hope you, asked for a new password for your account with Sumpless."],
    link: keyLinkTo(publicOrigin, mailedPages.reset, token),
    linkText: "Choose a new password",
    closing: [
      "The link works once, for 30 minutes. Every phone is then asked to sign in again. " +
        "If it was not you, your password stays as it is and you need do nothing.",
    ],
  });

const toAccount = (publicOrigin: string) => ({
  link: `${publicOrigin}/account`,
  linkText: "Open your account",
});

export const newEmailMessage = (publicOrigin: string, token: string): Message =>
  compose({
    subject: "Confirm your new e-mail address for Sumpless",
    opening: ["Someone, we hope you, wants to use this address for an account with Sumpless."],
    link: keyLinkTo(publicOrigin, mailedPages.verify, token),
    linkText: "Use this address",
    closing: ["The link works once, for a day. If it was not you, you need do nothing."],
  });

export const emailChangeAskedMessage = (publicOrigin: string): Message =>
  compose({
    subject: "Your e-mail address for Sumpless is about to change",
    opening: [
      "Someone who knows your password asked to use another address for your account with Sumpless. " +
        "It changes once the link that was sent there is followed.",
    ],
    ...toAccount(publicOrigin),
    closing: ["If it was not you, change your password now: the link is then good for nothing."],
  });

export const emailChangedMessage = (publicOrigin: string): Message =>
  compose({
    subject: "Your e-mail address for Sumpless has changed",
    opening: [
      "Your account with Sumpless has another address now. Nothing more is sent to this one.",
    ],
    ...toAccount(publicOrigin),
    closing: ["If it was not you, write to whoever runs this logbook: they can help."],
  });

export const passwordChangedMessage = (publicOrigin: string): Message =>
  compose({
    subject: "Your password for Sumpless has changed",
    opening: [
      "Your account with Sumpless has a new password, and every other device was signed out.",
    ],
    ...toAccount(publicOrigin),
    closing: ["If it was not you, ask for a new password at once: the sign-in page sends a link."],
  });
