import { compose } from "./compose.ts";
import type { Message } from "./letter.ts";

/** To whoever an organiser wants in the club, with an account or without. */
export const invitationMessage = (clubName: string, url: string, days: number): Message =>
  compose({
    subject: `You are asked to join ${clubName}`,
    opening: [
      `${clubName} keeps an eye on its members' oil pumps with Sumpless, a logbook for ` +
        "oil-injected two-strokes, and asks you to join.",
    ],
    link: url,
    linkText: "Look at the club",
    closing: [
      "Joining shows nobody your bikes: you share each of them, or none, and can take it back at any time.",
      `The link works for ${days === 1 ? "one day" : `${days} days`}. If you do not know the club, you need do nothing.`,
    ],
  });
