/** Letters about a bike, each of which can be ended by a click. */
import { format, parseISO } from "date-fns";
import type { Due } from "../../shared/schemas/summary.ts";
import { compose, type Words } from "./compose.ts";
import type { Message } from "./letter.ts";

interface AboutBike {
  bikeName: string;
  link: string;
  unsubscribe: NonNullable<Words["unsubscribe"]>;
}

const day = (date: string) => format(parseISO(date.slice(0, 10)), "d MMMM yyyy");
const hours = (value: number) => `${Math.abs(value).toFixed(1)} engine hours`;

/** What is known of when: hours by the last reading, and the likely date where there is one. */
function whenDue({ inHours, onDate }: Due, readAt: string | null, overdue: boolean): string {
  const byHours = inHours < 0 ? `It is ${hours(inHours)} over` : `${hours(inHours)} are left`;
  const read = readAt ? `, by the reading of ${day(readAt)}` : "";
  const falls = overdue ? "fell" : "falls";
  const byDate = onDate ? ` As the bike is ridden, it ${falls} due about ${day(onDate)}.` : "";
  return `${byHours}${read}.${byDate}`;
}

export const dueMessage = ({
  bikeName,
  due,
  readAt,
  overdue,
  ...about
}: AboutBike & { due: Due; readAt: string | null; overdue: boolean }): Message =>
  compose({
    ...about,
    subject: `${bikeName}: delivery check ${overdue ? "overdue" : "due soon"}`,
    opening: [
      `The next delivery check of ${bikeName} ${overdue ? "is overdue" : "is due soon"}. ${whenDue(due, readAt, overdue)}`,
      due.reason,
    ],
    linkText: `Open ${bikeName}`,
    closing: ["If you have ridden since, log the engine hours: the date follows them."],
  });

/** To the owner, or, naming the owner, to a mechanic of a club that the bike is shared with. */
export interface AboutStop extends AboutBike {
  ownerName: string | null;
}

export const stopMessage = ({
  bikeName,
  ownerName,
  authorName,
  ratio,
  ...about
}: AboutStop & { authorName: string; ratio: number | null }): Message => {
  const whose = ownerName === null ? bikeName : `${bikeName}, the bike of ${ownerName},`;
  const share = ratio === null ? "" : `, at ${Math.round(ratio * 100)} % of its baseline`;
  return compose({
    ...about,
    subject: `${bikeName}: delivery low, stop`,
    opening: [
      `After an entry by ${authorName}, the delivery of ${whose} is judged low${share}. Stop, find the cause.`,
      "Do not ride it before the cause is found and another check holds.",
    ],
    linkText: `Open ${bikeName}`,
    closing: [
      "The verdict is a guide: the maker's manual and a licensed mechanic come first. In doubt, do not ride.",
    ],
  });
};

/** Of a *stop* that somebody wrote, whatever was measured. */
export const stopAdviceMessage = ({
  bikeName,
  ownerName,
  authorName,
  text,
  ...about
}: AboutStop & { authorName: string; text: string }): Message =>
  compose({
    ...about,
    subject: `${bikeName}: stop advised`,
    opening: [
      `${authorName} advises to stop riding ${bikeName}${ownerName === null ? "" : `, the bike of ${ownerName}`}, and wrote:`,
      text,
      "This stands, whatever is measured, until a later note lifts it.",
    ],
    linkText: `Open ${bikeName}`,
    closing: ["If you do not know why, ask whoever wrote it before the bike is ridden."],
  });
