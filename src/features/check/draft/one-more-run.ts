import { measureDelivery } from "../../../../shared/delivery/measure-delivery.ts";
import type { CheckBody, Run, Sequence } from "../../../../shared/schemas/entry.ts";
import { hasRoom } from "./check-draft.ts";

const isLevels = (run: Run) => "endMl" in run;

/** What the counted runs read: their mean, and how far the lowest and highest lie apart, mL. */
export function runStatistics(
  body: CheckBody,
): { count: number; meanMl: number; spreadMl: number } | null {
  const volumes = body.runs.flatMap((run) =>
    isLevels(run) && !run.void ? [run.endMl - run.startMl] : [],
  );
  if (volumes.length === 0) return null;
  return {
    count: volumes.length,
    meanMl: volumes.reduce((sum, volume) => sum + volume, 0) / volumes.length,
    spreadMl: Math.max(...volumes) - Math.min(...volumes),
  };
}

/** The check with one run more, like the mean of those before: on top where the barrel has room. */
export function withOneMoreRun(body: CheckBody): CheckBody {
  const meanMl = runStatistics(body)?.meanMl;
  if (meanMl === undefined) return body;
  const last = body.runs.at(-1);
  const levelMl = last && isLevels(last) && !last.void ? last.endMl : 0;
  const startMl = hasRoom(body, levelMl, meanMl) ? levelMl : 0;
  return { ...body, runs: [...body.runs, { startMl, endMl: startMl + meanMl }] };
}

/** Standard uncertainty of a check's delivery, mL a run; null where nothing counts. */
export const uncertaintyMl = (body: CheckBody, sequence: Sequence | null): number | null =>
  measureDelivery(body, sequence).delivery?.uMl ?? null;
