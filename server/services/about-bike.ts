import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import type { Reminders } from "../../shared/schemas/reminders.ts";
import { unsubscribeToken } from "../auth/unsubscribe-token.ts";
import { linkTo } from "../mail/compose.ts";
import type { MailParts } from "./mail-parts.ts";

/** What every letter about a bike holds: its name, the way to it, and the way out of such letters. */
export function aboutBike(
  { store, publicOrigin }: MailParts,
  { bikeId, bikeName, userId }: { bikeId: string; bikeName: string; userId: string },
  kind: keyof Reminders,
) {
  const token = unsubscribeToken(store.secret, userId, kind);
  return {
    bikeName,
    link: `${publicOrigin}/bikes/${bikeId}`,
    unsubscribe: {
      page: linkTo(publicOrigin, mailedPages.unsubscribe, token),
      oneClick: linkTo(publicOrigin, "/api/unsubscribe", token),
    },
  };
}
