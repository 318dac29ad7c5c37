import { patterns } from "../../ui/paths.ts";

/** What the sign-in page says to whoever has just left. */
export const leftWords = {
  deleted: "Your account and its bikes are deleted.",
  cleared: "You are signed out, and nothing of yours is kept on this phone.",
};

/** Goes to the sign-in page by loading it: nothing of the account is left in memory. */
export const leaveThisPhone = (how: keyof typeof leftWords) =>
  window.location.replace(`${patterns.signIn}?left=${how}`);

export const leftWordsIn = (search: URLSearchParams): string | undefined =>
  leftWords[search.get("left") as keyof typeof leftWords];
