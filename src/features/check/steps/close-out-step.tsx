import { useState } from "react";
import { Navigate } from "react-router-dom";
import type { BikeRecord } from "../../../offline/index.ts";
import { stepPaths } from "../check-paths.ts";
import { useOpenDraft } from "../draft/use-open-draft.ts";
import { LateCloseOut } from "./late-close-out.tsx";
import { SaveCheck } from "./save-check-step.tsx";

type Opened = ReturnType<typeof useOpenDraft>;

/** Closes out the check being done, or one that was saved or given up with the hose still off. */
export function CloseOutStep({ record }: { record: BikeRecord }) {
  const opened = useOpenDraft(record);
  if (!opened.ready) return <main className="flex-1" aria-busy />;
  return <CloseOut record={record} opened={opened} />;
}

function CloseOut({ record, opened }: { record: BikeRecord; opened: Opened }) {
  const { open, hoseMaybeOff, change } = opened;
  // Saving takes away what called for this step; it stays the same step until the page is left.
  const [saves] = useState(() => open !== null && open.draft.runs.length > 0);
  const [late] = useState(hoseMaybeOff);
  if (saves) return open ? <SaveCheck check={open} /> : <main className="flex-1" aria-busy />;
  if (!late) return <Navigate to={stepPaths(record.bikeId).start} replace />;
  return (
    <LateCloseOut
      record={record}
      onClosed={() => change((draft) => ({ ...draft, hoseMaybeOff: false }))}
    />
  );
}
