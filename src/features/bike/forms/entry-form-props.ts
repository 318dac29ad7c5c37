import type { EntryKind, LogEntryOf } from "../../../../shared/schemas/entry.ts";
import type { BikeRecord } from "../../../offline/index.ts";

export interface EntryFormProps<K extends EntryKind> {
  record: BikeRecord;
  /** The refused entry to start from, if one is written anew. */
  mends: LogEntryOf<K> | null;
}
