import type { EntryKind } from "../../../../shared/schemas/entry.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { logEntryPath } from "../../../ui/paths.ts";

const kinds: readonly { kind: EntryKind; label: string }[] = [
  { kind: "hours", label: "Hours" },
  { kind: "work", label: "Work" },
  { kind: "topup", label: "Top-up" },
  { kind: "note", label: "Note" },
  { kind: "meter", label: "Meter change" },
];

/** The short forms, one for each kind of entry. */
export function WriteInLog({ bikeId }: { bikeId: string }) {
  return (
    <nav aria-label="Write in the log">
      <ul className="flex flex-wrap gap-2">
        {kinds.map(({ kind, label }) => (
          <li key={kind} className="flex-1">
            <ButtonLink wide to={logEntryPath(bikeId, kind)} className="whitespace-nowrap">
              {label}
            </ButtonLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
