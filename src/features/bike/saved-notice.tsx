import { useLocation } from "react-router-dom";
import { EntryStateMark } from "../../ui/entry-state-mark.tsx";

/** Said once, after a form was saved and has led back here. */
export function SavedNotice() {
  const { state } = useLocation() as { state: { saved?: boolean } | null };
  return <div role="status">{state?.saved && <EntryStateMark state="saved" />}</div>;
}
