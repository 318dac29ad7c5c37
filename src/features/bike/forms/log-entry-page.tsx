import { Navigate, useParams, useSearchParams } from "react-router-dom";
import type { EntryKind, LogEntryOf } from "../../../../shared/schemas/entry.ts";
import type { BikeWithLog } from "../../../offline/index.ts";
import { bikeDetailsPath, checkPath } from "../../../ui/paths.ts";
import { NoPageHere } from "../no-page-here.tsx";
import { HoursForm } from "./hours-form.tsx";
import { MeterForm } from "./meter-form.tsx";
import { NoteForm } from "./note-form.tsx";
import { TopupForm } from "./topup-form.tsx";
import { WorkForm } from "./work-form.tsx";

/** The form that the address names. */
export function LogEntryPage({ bike: { record, log } }: { bike: BikeWithLog }) {
  const { kind } = useParams();
  const [search] = useSearchParams();
  const kept = log.find(({ entry }) => entry.id === search.get("mends"));
  const mended = <K extends EntryKind>(kind: K) =>
    kept?.understood && kept.entry.kind === kind ? (kept.entry as LogEntryOf<K>) : null;

  switch (kind as EntryKind) {
    case "hours":
      return <HoursForm record={record} mends={mended("hours")} />;
    case "work":
      return <WorkForm record={record} mends={mended("work")} />;
    case "meter":
      return <MeterForm record={record} mends={mended("meter")} />;
    case "topup":
      return <TopupForm record={record} mends={mended("topup")} />;
    case "note":
      return <NoteForm record={record} mends={mended("note")} />;
    case "check":
      return <Navigate to={checkPath(record.bikeId)} replace />;
    case "bike":
      return <Navigate to={bikeDetailsPath(record.bikeId)} replace />;
    default:
      return <NoPageHere record={record} />;
  }
}
