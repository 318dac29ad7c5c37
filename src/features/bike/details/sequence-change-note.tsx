import type { BikeDetails } from "../../../../shared/logbook/bike-details.ts";
import { Notice } from "../../../ui/notice.tsx";
import type { DetailsForm } from "./details-patch.ts";
import { changesSequence } from "./changes-sequence.ts";

/** Said before it is saved: another sequence delivers something else, so the baseline starts anew. */
export function SequenceChangeNote({ details, form }: { details: BikeDetails; form: DetailsForm }) {
  if (!changesSequence(details, form)) return null;
  return (
    <Notice tone="caution" title="This starts a new baseline">
      <p>
        Another sequence delivers another volume, so the next check becomes the new baseline. What
        came before stays to be seen.
      </p>
    </Notice>
  );
}
