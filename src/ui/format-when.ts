/** Instants in the rider's own time zone. The words are English, so the dates are too. */
const dayFormat: Intl.DateTimeFormatOptions = { day: "numeric", month: "short", year: "numeric" };
const timeFormat: Intl.DateTimeFormatOptions = { hour: "2-digit", minute: "2-digit" };

/** `1 Dec 2026` */
export const formatDay = (instant: string) =>
  new Date(instant).toLocaleDateString("en-GB", dayFormat);

/** `1 Dec 2026, 08:07` */
export const formatWhen = (instant: string) =>
  new Date(instant).toLocaleString("en-GB", { ...dayFormat, ...timeFormat });

/** A date without a time (`2026-12-01`), which must not move with the zone. */
export const formatDate = (date: string) =>
  new Date(date).toLocaleDateString("en-GB", { ...dayFormat, timeZone: "UTC" });
