import { formatMl, GIVE_OR_TAKE } from "./format-quantity.ts";

export interface ColumnReading {
  /** Null while nothing has been measured. */
  readingMl: number | null;
  /** Standard uncertainty of the reading. */
  uMl?: number | null;
  baselineMl?: number | null;
  /** The level under which the delivery is low. */
  limitMl?: number | null;
}

/** What the Column shows, in a sentence. */
export function columnSentence({ readingMl, uMl, baselineMl, limitMl }: ColumnReading): string {
  const reading =
    readingMl === null
      ? "Nothing measured yet"
      : `Delivery ${formatMl(readingMl)} a run` +
        (uMl ? `, give or take ${formatMl(GIVE_OR_TAKE * uMl)}` : "");
  const limit = limitMl && ` ${sideOf(readingMl, limitMl)} ${formatMl(limitMl)}`;
  const baseline = baselineMl && ` baseline ${formatMl(baselineMl)}`;
  const marked = [limit, baseline].filter(Boolean).join(";");
  return marked ? `${reading}:${marked}.` : `${reading}.`;
}

function sideOf(readingMl: number | null, limitMl: number): string {
  if (readingMl === null) return "limit";
  return readingMl < limitMl ? "under the limit of" : "at or above the limit of";
}
