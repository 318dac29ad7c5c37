import type { WorkItem } from "../../shared/schemas/entry.ts";

/** Work as it stands in a log. */
export const workWords: Record<WorkItem, string> = {
  "pump-renewed": "Pump renewed",
  "pump-cleaned": "Pump cleaned",
  "screen-cleaned": "Screen or filter cleaned",
  "hose-renewed": "Hose renewed",
  "line-bled": "Oil line bled",
  "controller-updated": "Controller updated",
  "oil-changed": "Oil changed",
  other: "Other work",
};
