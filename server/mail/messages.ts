/** Letters about an account. They hold nothing that a stranger could have typed into the sign-up form. */
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import { compose, linkTo } from "./compose.ts";
import type { Message } from "./letter.ts";

export const verificationMessage = (publicOrigin: string, token: string): Message =>
  compose({
    subject: "Confirm your e-mail address for Sumpless",
    opening: ["Please confirm that this address is yours, so that reminders may be sent here."],
    link: linkTo(publicOrigin, mailedPages.verify, token),
    linkText: "Confirm this address",
    closing: [
      "The link works once, for seven days. If you have no account with Sumpless, you need do nothing.",
    ],
  });

export const passwordResetMessage = (publicOrigin: string, token: string): Message =>
  compose({
    subject: "Choose a new password for Sumpless",
    opening: ["Someone, we hope you, asked for a new password for your account with Sumpless."],
    link: linkTo(publicOrigin, mailedPages.reset, token),
    linkText: "Choose a new password",
    closing: [
      "The link works once, for 30 minutes. Every phone is then asked to sign in again. " +
        "If it was not you, your password stays as it is and you need do nothing.",
    ],
  });
