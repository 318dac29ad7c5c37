import Bowser from "bowser";

/** More of a header than this says nothing about the browser. */
const MAX_LENGTH = 400;

/** A browser as its owner would name it, "Chrome on Android": enough to tell one's phones apart. */
export function deviceName(userAgent: string | undefined): string {
  if (!userAgent) return "Unknown browser";
  const { browser, os } = Bowser.parse(userAgent.slice(0, MAX_LENGTH));
  return [browser.name || "Unknown browser", os.name].filter(Boolean).join(" on ");
}
