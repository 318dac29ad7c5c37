import { useMemo } from "react";
import { useBikes, useSyncStatus } from "../../../offline/index.ts";
import { boardOf, type BoardRow } from "./board.ts";
import { useLineUp } from "./use-line-up.ts";

const noRows: BoardRow[] = [];

/** A club's board: the server's answer, or its last one, and what this phone knows better. */
export function useBoard(clubId: string) {
  const answer = useLineUp(clubId);
  const { data: bikes } = useBikes();
  const { lastSyncAt } = useSyncStatus();
  const { data: lineUp, dataUpdatedAt: toldAt } = answer;
  const rows = useMemo(() => {
    if (!lineUp) return noRows;
    const syncedAt = lastSyncAt ? Date.parse(lastSyncAt) : 0;
    return boardOf({ lineUp, toldAt, bikes: bikes ?? [], syncedAt });
  }, [lineUp, toldAt, bikes, lastSyncAt]);
  return { answer, rows };
}
