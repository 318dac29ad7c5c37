import { MAX_RUNS } from "../../../../shared/schemas/entry.ts";
import { Button } from "../../../ui/button.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import type { QuickRunsProps } from "./quick-runs.tsx";

const STEP_ML = 0.1;

/** What each run gave, where a note says no more. */
export function VolumeRuns({ draft, edit, errors }: QuickRunsProps) {
  const setVolumes = (change: (volumes: string[]) => string[]) =>
    edit((now) => ({ ...now, volumes: change(now.volumes) }));
  return (
    <>
      {draft.volumes.map((volume, index) => (
        <NumberField
          key={index}
          label={`Run ${index + 1}: delivered`}
          error={errors[`volumes.${index}`] ?? errors[`body.runs.${index}.deliveredMl`]}
          value={volume}
          onChange={(text) =>
            setVolumes((volumes) => volumes.map((one, at) => (at === index ? text : one)))
          }
          step={STEP_ML}
          min={0}
          unit="mL"
        />
      ))}
      <div className="flex flex-wrap gap-2">
        {draft.volumes.length < MAX_RUNS && (
          <Button onClick={() => setVolumes((volumes) => [...volumes, ""])}>One more run</Button>
        )}
        {draft.volumes.length > 1 && (
          <Button onClick={() => setVolumes((volumes) => volumes.slice(0, -1))}>
            Take the last run out
          </Button>
        )}
      </div>
    </>
  );
}
