import { Navigate } from "react-router-dom";
import type { BikeRecord } from "../../../offline/index.ts";
import { stepPaths } from "../check-paths.ts";
import { useHoseMaybeOff } from "../draft/use-hose-maybe-off.ts";
import { useOpenDraft } from "../draft/use-open-draft.ts";
import { LateCloseOut } from "./late-close-out.tsx";
import { SaveCheck } from "./save-check-step.tsx";

/** Closes out the check being done, or one that was saved or given up with the hose still off. */
export function CloseOutStep({ record }: { record: BikeRecord }) {
  const { ready, open, change } = useOpenDraft(record);
  const hoseMaybeOff = useHoseMaybeOff(record);
  if (!ready) return <main className="flex-1" aria-busy />;
  if (open && open.draft.runs.length > 0) return <SaveCheck check={open} />;
  if (hoseMaybeOff)
    return (
      <LateCloseOut
        record={record}
        onClosed={() => change((draft) => ({ ...draft, hoseMaybeOff: false }))}
      />
    );
  return <Navigate to={stepPaths(record.bikeId).start} replace />;
}
