import type { WorkItem } from "../../../../shared/schemas/entry.ts";

/** Work after which the pump legitimately delivers something else than before. */
const resetting: readonly WorkItem[] = ["pump-renewed", "controller-updated"];

export const proposesSeries = (items: readonly WorkItem[]): boolean =>
  items.some((item) => resetting.includes(item));

/** Why a new baseline is, or is not, called for after this work. */
export function seriesAdvice(items: readonly WorkItem[]): string {
  return proposesSeries(items)
    ? "This changes what the pump delivers: the next check becomes the new baseline, and what came before stays to be seen."
    : "After cleaning, bleeding, or work on screen, hose or oil the old baseline stays: it tells whether the cure worked.";
}
