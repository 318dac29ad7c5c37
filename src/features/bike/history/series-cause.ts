import type { SeriesSummary } from "../../../../shared/schemas/summary.ts";
import { workWords } from "../../../ui/work-words.ts";

/** What began a baseline series, in a few words. */
export function seriesCause({
  startedBy,
  items,
}: Pick<SeriesSummary, "startedBy" | "items">): string {
  if (startedBy === "first-check") return "First check";
  if (startedBy === "sequence") return "Other sequence";
  const [first = "Work", ...others] = items.map((item) => workWords[item]);
  return [first, ...others.map((words) => words.toLowerCase())].join(", ");
}
