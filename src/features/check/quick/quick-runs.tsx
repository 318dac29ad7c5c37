import { Choice } from "../../../ui/choice.tsx";
import type { QuickDraft } from "./quick-draft.ts";
import { LevelRuns } from "./level-runs.tsx";
import { VolumeRuns } from "./volume-runs.tsx";

export interface QuickRunsProps {
  draft: QuickDraft;
  edit: (change: (draft: QuickDraft) => QuickDraft) => void;
  errors: Record<string, string>;
}

/** The runs, by the levels read, or by the volume alone. */
export function QuickRuns(props: QuickRunsProps) {
  const { draft, edit } = props;
  return (
    <div className="flex flex-col gap-4">
      {draft.known === "levels" ? <LevelRuns {...props} /> : <VolumeRuns {...props} />}
      <Choice
        label="What is known of the runs"
        options={[
          { value: "levels", label: "Levels" },
          { value: "volumes", label: "Volume alone" },
        ]}
        value={draft.known}
        onChange={(known) => edit((now) => ({ ...now, known }))}
      />
    </div>
  );
}
