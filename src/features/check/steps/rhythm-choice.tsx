import { Choice } from "../../../ui/choice.tsx";
import { changeRun } from "../draft/check-draft.ts";
import { useRun } from "./use-run.ts";

/** What one hears; a run of another rhythm than the bike's is not counted. */
export function RhythmChoice() {
  const { n, run, change } = useRun();
  return (
    <Choice
      label="How does it tick?"
      options={[
        { value: "steady", label: "Steady" },
        { value: "alternating", label: "Slow, fast" },
      ]}
      value={run.rhythm}
      onChange={(rhythm) => change((now) => changeRun(now, n, { rhythm }))}
    />
  );
}
