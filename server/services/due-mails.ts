import { addDays, formatISO, subDays } from "date-fns";
import { setImmediate } from "node:timers/promises";
import { DUE_SOON_HOURS, type LineUpFacts } from "../../shared/schemas/club.ts";
import { summarySchema } from "../../shared/schemas/summary.ts";
import type { DueBike } from "../db/due-bikes.ts";
import type { Store } from "../db/store.ts";
import { dueMessage } from "../mail/bike-messages.ts";
import { aboutBike } from "./about-bike.ts";
import type { MailParts } from "./mail-parts.ts";
import { bikeSummaryJson } from "./read-bikes.ts";

/** A check whose likely date is this close is due soon. */
const SOON_DAYS = 7;
/** About one bike nothing more is sent for so long; a mail that cannot be sent is tried as long. */
const QUIET_DAYS = 7;

const dateOf = (time: Date) => formatISO(time, { representation: "date" });

/** A check within these is due soon. */
const limits = (now: Date) => ({
  inHours: DUE_SOON_HOURS,
  onDate: dateOf(addDays(now, SOON_DAYS)),
});

function isDue({ place, lastCheckAt, dueInHours, onDate }: LineUpFacts, now: Date): boolean {
  const soon = limits(now);
  const isSoon = dueInHours <= soon.inHours || (onDate !== null && onDate <= soon.onDate);
  return isSoon && lastCheckAt !== null && place !== "retired";
}

const isOverdue = ({ dueInHours, onDate }: LineUpFacts, now: Date) =>
  dueInHours < 0 || (onDate !== null && onDate < dateOf(now));

/** Once when it is due soon and once when it is overdue; another check begins anew. */
function occasionOf(facts: LineUpFacts, now: Date): string {
  const atHours = ((facts.hoursNow ?? 0) + facts.dueInHours).toFixed(1);
  return `${facts.bikeId} ${isOverdue(facts, now) ? "overdue" : "soon"} ${atHours}`;
}

/**
 * What still waits to be sent of a check that is due no more, or has since become overdue, is not
 * sent. To be called in the transaction that stores the entry which made it so.
 */
export function withdrawDue({ mails }: Store, facts: LineUpFacts, now = new Date()): void {
  const occasion = isDue(facts, now) ? occasionOf(facts, now) : null;
  mails.withdrawAbout(facts.bikeId, "due", (told) => told === occasion);
}

function mailDue(parts: MailParts, { facts, userId, email }: DueBike, now: Date): void {
  const { bikeId, name: bikeName } = facts;
  const occasion = occasionOf(facts, now);
  if (parts.store.mails.isKnown(userId, "due", occasion)) return;
  const { due, hours } = summarySchema.parse(
    JSON.parse(bikeSummaryJson(parts.store, userId, bikeId)),
  );
  parts.mailer.queue({
    ...{ topic: "due", userId, bikeId, to: email, occasion },
    goodUntil: addDays(now, QUIET_DAYS).getTime(),
    message: dueMessage({
      ...aboutBike(parts, { bikeId, bikeName, userId }, "dueMails"),
      ...{ due, readAt: hours.readAt, overdue: isOverdue(facts, now) },
    }),
  });
}

/**
 * Reminds the owners whose bikes' checks are due soon or overdue, by engine hours or by the likely
 * date. Whom it told stands in the database, so that it may run at any time, as often as one likes.
 */
export async function mailAllDue(parts: MailParts, now = new Date()): Promise<void> {
  const found = parts.store.dueBikes.find({
    ...limits(now),
    remindedSince: subDays(now, QUIET_DAYS).toISOString(),
  });
  for (const bike of found) {
    parts.store.write(() => mailDue(parts, bike, now));
    // Requests come first.
    await setImmediate();
  }
}
