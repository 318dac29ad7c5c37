/** Instants in the rider's own time zone. The words are English, so the dates are too. */
const dayFormat: Intl.DateTimeFormatOptions = { day: "numeric", month: "short", year: "numeric" };
const timeFormat: Intl.DateTimeFormatOptions = { hour: "2-digit", minute: "2-digit" };

/** `1 Dec 2026` */
export const formatDay = (instant: string) =>
  new Date(instant).toLocaleDateString("en-GB", dayFormat);

/** `1 Dec 2026, 08:07` */
export const formatWhen = (instant: string) =>
  new Date(instant).toLocaleString("en-GB", { ...dayFormat, ...timeFormat });

/** `08:07` today, `1 Dec` on another day: for the quiet line at the top. */
export function formatSince(instant: string, now = new Date()): string {
  const at = new Date(instant);
  return at.toDateString() === now.toDateString()
    ? at.toLocaleTimeString("en-GB", timeFormat)
    : at.toLocaleDateString("en-GB", { day: "numeric", month: "short" });
}

/** A date without a time (`2026-12-01`), which must not move with the zone. */
export const formatDate = (date: string) =>
  new Date(date).toLocaleDateString("en-GB", { ...dayFormat, timeZone: "UTC" });
