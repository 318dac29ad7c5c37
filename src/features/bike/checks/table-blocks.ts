import type { DeliveryHistory, HistorySeries } from "../history/delivery-history.ts";
import type { HistoryPoint } from "../history/history-point.ts";

export interface TableBlock {
  series: HistorySeries;
  points: HistoryPoint[];
}

/**
 * The newest `most` checks, newest first, under their series. A series of which none is left is
 * left out; one that has no check yet is shown: it is news.
 */
export function tableBlocks(
  { series, points }: Pick<DeliveryHistory, "series" | "points">,
  most: number,
): TableBlock[] {
  let room = most;
  const blocks: TableBlock[] = [];
  for (const [index, one] of [...series.entries()].toReversed()) {
    const own = points.filter((point) => point.series === index).toReversed();
    const shown = own.slice(0, room);
    room -= shown.length;
    if (shown.length > 0 || own.length === 0) blocks.push({ series: one, points: shown });
  }
  return blocks;
}
