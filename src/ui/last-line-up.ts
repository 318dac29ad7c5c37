/** The Line-up looked at last in this window: the way back from a member's bike. */
import { patterns } from "./paths.ts";

const KEY = "sumpless-last-line-up";

export function rememberLineUp(address: string): void {
  try {
    sessionStorage.setItem(KEY, address);
  } catch {
    // The way back then leads to the list of clubs.
  }
}

export function backToLineUp(): { to: string; label: string } {
  try {
    const address = sessionStorage.getItem(KEY);
    if (address) return { to: address, label: "Line-up" };
  } catch {
    // As where none was looked at.
  }
  return { to: patterns.clubs, label: "Clubs" };
}
