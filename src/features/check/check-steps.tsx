import { Navigate, Outlet } from "react-router-dom";
import type { BikeRecord } from "../../offline/index.ts";
import { stepPaths } from "./check-paths.ts";
import type { OpenCheckContext } from "./open-check.ts";
import { useOpenDraft } from "./draft/use-open-draft.ts";

/** Lets a step be seen only while there is a check to do; otherwise the start page offers one. */
export function CheckSteps({ record }: { record: BikeRecord }) {
  const { ready, open } = useOpenDraft(record);
  if (!ready) return <main className="flex-1" aria-busy />;
  if (!open) return <Navigate to={stepPaths(record.bikeId).start} replace />;
  return <Outlet context={open satisfies OpenCheckContext} />;
}
