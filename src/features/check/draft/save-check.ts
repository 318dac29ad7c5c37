import { CHECK_FORM, saveEntry, type BikeRecord } from "../../../offline/index.ts";
import type { Sequence } from "../../../../shared/schemas/entry.ts";
import type { CheckEntry } from "./check-entry.ts";
import { draftsWritten } from "./use-live-draft.ts";

/**
 * Saves a check, its draft going in the same step. A sequence found out or chosen in it is noted on
 * the bike first, dated so that this check is already counted by it; only the owner may do that.
 */
export async function saveCheck(
  record: BikeRecord,
  entry: CheckEntry,
  { form = CHECK_FORM, sequence = null }: { form?: string; sequence?: Sequence | null } = {},
): Promise<string> {
  await draftsWritten();
  if (sequence && !record.details.sequence && record.access === "owner")
    await saveEntry({
      bikeId: record.bikeId,
      kind: "bike",
      at: entry.at,
      hours: null,
      body: { sequence },
    });
  const kept = await saveEntry(entry, { draft: { bikeId: record.bikeId, form } });
  return kept.entry.id;
}
