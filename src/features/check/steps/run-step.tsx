import { Navigate } from "react-router-dom";
import { furthestStep } from "../check-paths.ts";
import { DrippingRun } from "./dripping-run.tsx";
import { ForgottenRun } from "./forgotten-run.tsx";
import { ReadyRun } from "./ready-run.tsx";
import { RunningRun } from "./running-run.tsx";
import { useRun } from "./use-run.ts";
import { useRunPhase } from "./use-run-phase.ts";
import { useWakeLock } from "./use-wake-lock.ts";
import { VoidedRun } from "./voided-run.tsx";

/** One run of the pump, from the first tick to the last drop. */
export function RunStep() {
  const { n, exists, run, draft, paths } = useRun();
  const phase = useRunPhase();
  useWakeLock();
  if (!exists) return <Navigate to={furthestStep(paths, draft)} replace />;
  if (run.voided) return <VoidedRun key={n} />;
  switch (phase.phase) {
    case "ready":
      return <ReadyRun key={n} />;
    case "running":
      return <RunningRun key={n} seconds={phase.seconds} />;
    case "forgotten":
      return <ForgottenRun key={n} />;
    default:
      return (
        <DrippingRun key={n} secondsLeft={phase.phase === "dripping" ? phase.secondsLeft : 0} />
      );
  }
}
