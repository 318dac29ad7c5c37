import type { WorkItem } from "../../../../shared/schemas/entry.ts";

interface Cause {
  id: string;
  line: string;
  /** What it counts as in the log. */
  item: WorkItem;
  /** True where the pump legitimately gives something else afterwards. */
  resets?: true;
}

/** Where to look when the delivery drops, in order: the cheap and likely first (common practice). */
export const causes: readonly Cause[] = [
  { id: "warm", line: "Repeated warm, with a charged battery", item: "other" },
  { id: "tank", line: "Oil level and tank vent looked at", item: "other" },
  { id: "screen", line: "Screen or filter cleaned", item: "screen-cleaned" },
  // Not `line-bled`: that stands for a close-out, and would say that the hose is back on.
  { id: "air", line: "Air leak looked for, clips seated, line bled", item: "other" },
  { id: "hose", line: "Kinked or swollen hose renewed", item: "hose-renewed" },
  { id: "volts", line: "Connector, earth and volts under load looked at", item: "other" },
  {
    id: "clean",
    line: "Pump cleaned, where the manual allows it",
    item: "pump-cleaned",
  },
  { id: "renew", line: "Pump replaced", item: "pump-renewed", resets: true },
  {
    id: "controller",
    line: "Controller software updated",
    item: "controller-updated",
    resets: true,
  },
];

export const chosenCauses = (ids: readonly string[]) => causes.filter(({ id }) => ids.includes(id));

/** What was done, as one entry of work holds it. */
export function workBody(ids: readonly string[], startsSeries: boolean) {
  const chosen = chosenCauses(ids);
  const others = chosen.filter(({ item }) => item === "other").map(({ line }) => `${line}.`);
  return {
    items: [...new Set(chosen.map(({ item }) => item))],
    startsSeries,
    ...(others.length > 0 ? { note: others.join("\n") } : {}),
  };
}
