import type { EntryKind } from "../../../../shared/schemas/entry.ts";
import type { RefusalReason } from "../../../../shared/schemas/sync.ts";
import type { KeptEntry } from "../../../offline/index.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { bikeDetailsPath, mendEntryPath } from "../../../ui/paths.ts";
import { asJson, saveFile } from "../../../ui/save-file.ts";
import { refusalWords } from "../../../ui/words.ts";

interface Props {
  kept: KeptEntry;
  reason: RefusalReason;
}

/** The kinds that the log's forms can write anew from an entry. */
const mendable: readonly EntryKind[] = ["hours", "work", "meter", "topup", "note"];

/** Why the server did not accept an entry, and the ways on. */
export function RefusedEntry({ kept, reason }: Props) {
  const errors = kept.state === "refused" ? Object.values(kept.errors ?? {}) : [];
  return (
    <Notice tone="caution" title={refusalWords[reason]}>
      {errors.length > 0 && (
        <ul>
          {errors.map((error) => (
            <li key={error}>{error}</li>
          ))}
        </ul>
      )}
      <div className="flex flex-wrap gap-2">
        <WriteAnew kept={kept} reason={reason} />
        <Button onClick={() => saveFile(asJson(kept.entry), `entry-${kept.entry.id}.json`)}>
          Save as a file
        </Button>
      </div>
    </Notice>
  );
}

/** Only where writing it anew can help: what passes by itself is best left alone. */
function WriteAnew({ kept: { understood, entry }, reason }: Props) {
  if (!understood || !["invalid", "id-taken"].includes(reason)) return null;
  if (entry.kind === "bike")
    return <ButtonLink to={bikeDetailsPath(entry.bikeId)}>Change the details</ButtonLink>;
  if (!mendable.includes(entry.kind)) return null;
  return (
    <ButtonLink to={mendEntryPath(entry.bikeId, entry.kind, entry.id)}>Write it anew</ButtonLink>
  );
}
