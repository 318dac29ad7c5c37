import { useState } from "react";
import { bikeTag } from "../../../shared/logbook/bike-tag.ts";
import { dropDraft, isHoseMaybeOff } from "../../offline/index.ts";
import { useLeftDrafts } from "../../offline/left-drafts.ts";
import type { Draft } from "../../offline/types.ts";
import { Button } from "../../ui/button.tsx";
import { formatWhen } from "../../ui/format-when.ts";
import { asJson, saveFile } from "../../ui/save-file.ts";
import { Sheet } from "../../ui/sheet.tsx";

/** What was typed of bikes that were taken back meanwhile; all that is left of such a bike here. */
export function HalfDone() {
  const drafts = useLeftDrafts();
  if (drafts.length === 0) return null;
  return (
    <section aria-labelledby="half-done" className="flex flex-col gap-3">
      <h2 id="half-done" className="text-2xl">
        Typed, and not saved
      </h2>
      <p>
        The bike is no longer shared with you, or was deleted: its log does not take this from you
        any more. Save it as a file, to keep it or to hand it to the owner.
      </p>
      <ul className="divide-y divide-rule border-y border-rule">
        {drafts.map((draft) => (
          <li key={`${draft.bikeId} ${draft.form}`} className="flex flex-col gap-2 py-2">
            <LeftDraft draft={draft} />
          </li>
        ))}
      </ul>
    </section>
  );
}

const save = (draft: Draft) =>
  saveFile(asJson(draft), `sumpless-not-saved-${bikeTag(draft.bikeId)}.json`);

function LeftDraft({ draft }: { draft: Draft }) {
  const [discarding, setDiscarding] = useState(false);
  const what = `Bike ${bikeTag(draft.bikeId)}: ${draft.form === "causes" ? "causes ticked" : "delivery check"}`;
  return (
    <>
      <p className="leading-snug">
        <strong className="block">{what}</strong>
        <span className="text-soft">{formatWhen(draft.savedAt)}</span>
      </p>
      {isHoseMaybeOff(draft.content) && (
        <p className="font-bold text-low">Hose may be off: do not start</p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button className="flex-auto" onClick={() => save(draft)}>
          Save it as a file
        </Button>
        <Button className="flex-auto" onClick={() => setDiscarding(true)}>
          Discard
        </Button>
      </div>
      {discarding && (
        <Sheet title="Discard what was typed?" onClose={() => setDiscarding(false)}>
          <div className="flex flex-col gap-4">
            <p className="font-bold">{what}</p>
            <p>It is on this phone only. To keep it, save it as a file first.</p>
            <Button wide onClick={() => save(draft)}>
              Save it as a file
            </Button>
            <Button wide onClick={() => setDiscarding(false)}>
              Leave it here
            </Button>
            <Button look="danger" wide onClick={() => void dropDraft(draft.bikeId, draft.form)}>
              Discard it for good
            </Button>
          </div>
        </Sheet>
      )}
    </>
  );
}
