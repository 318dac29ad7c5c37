import { useEffect, useRef, useState } from "react";
import { soundAlarm } from "../alarm.ts";
import { runPhase, type RunPhase } from "../draft/run-phase.ts";
import { useRun } from "./use-run.ts";

/** Often enough for seconds to be counted. */
const EVERY_MS = 200;

/** Where the run stands now; the alarm sounds as the pump stops, and when the level can be read. */
export function useRunPhase(): RunPhase {
  const { run, sequence } = useRun();
  const [now, setNow] = useState(() => Date.now());
  const phase = runPhase(run, sequence?.seconds ?? null, now);
  const moves = !run.voided && (phase.phase === "running" || phase.phase === "dripping");
  useEffect(() => {
    if (!moves) return;
    const timer = setInterval(() => setNow(Date.now()), EVERY_MS);
    return () => clearInterval(timer);
  }, [moves]);
  useAlarm(run.voided ? "ready" : phase.phase, run.seconds !== null);
  return phase;
}

/** Sounds only for what happens while someone is here: not for what passed before a reload. */
function useAlarm(phase: RunPhase["phase"], stoppedByHand: boolean): void {
  const last = useRef(phase);
  useEffect(() => {
    const was = last.current;
    last.current = phase;
    if (was === "running" && phase === "dripping" && !stoppedByHand) soundAlarm(1);
    if (was === "dripping" && phase === "dripped") soundAlarm(2);
  }, [phase, stoppedByHand]);
}
