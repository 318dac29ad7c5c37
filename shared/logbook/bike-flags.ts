import type { FlagCode } from "../delivery/flags.ts";
import type { LogEntry, LogEntryOf } from "../schemas/entry.ts";
import type { JudgedSeries } from "./judge-series.ts";
import type { LifetimeHours } from "./lifetime-hours.ts";

const isCheck = (entry: LogEntry): entry is LogEntryOf<"check"> => entry.kind === "check";

const bleedsLine = (entry: LogEntry) =>
  entry.kind === "work" && entry.body.items.includes("line-bled");

/** Whether the oil hose may still be off: the last check was left open and no line bled since. */
function isHoseMaybeOff(standing: readonly LogEntry[]): boolean {
  const lastCheck = standing.findLastIndex(isCheck);
  const check = standing[lastCheck];
  if (!check || !isCheck(check) || check.body.closedOut) return false;
  return !standing.slice(lastCheck).some(bleedsLine);
}

/** What has to be said of the bike, whatever its last judged check. */
export function bikeFlags(
  standing: readonly LogEntry[],
  hours: LifetimeHours,
  series: readonly JudgedSeries[],
): FlagCode[] {
  const flags: FlagCode[] = [];
  const lastCheck = standing.findLast(isCheck);
  const counted = series.some(({ sessions }) =>
    sessions.some(({ checks }) => checks.some(({ entry }) => entry.id === lastCheck?.id)),
  );
  if (lastCheck && !counted) flags.push("check-not-counted");
  if (hours.doubtful.length > 0) flags.push("hours-doubtful");
  if (isHoseMaybeOff(standing)) flags.push("not-closed-out");
  return flags;
}
