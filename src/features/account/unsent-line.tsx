import { useState } from "react";
import { mayDiscard } from "../../offline/discard-refused.ts";
import { useBikes, type KeptEntry } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { EntryStateMark } from "../../ui/entry-state-mark.tsx";
import { formatWhen } from "../../ui/format-when.ts";
import { kindWords, refusalWords } from "../../ui/words.ts";
import { DiscardSheet } from "./discard-sheet.tsx";

/** An entry that the server does not have: what it is, where it stands, and the way on. */
export function UnsentLine({ kept }: { kept: KeptEntry }) {
  const bikes = useBikes().data;
  const bike = bikes?.find(({ bikeId }) => bikeId === kept.entry.bikeId);
  const kind = kept.understood ? kindWords[kept.entry.kind] : "From a newer version of the app";
  const what = bike?.details.name ? `${bike.details.name}: ${kind}` : kind;
  const [discarding, setDiscarding] = useState(false);
  return (
    <li className="py-2">
      <p className="font-bold">{what}</p>
      <p className="flex flex-wrap gap-x-3 text-soft">
        {formatWhen(kept.entry.at)}
        <EntryStateMark state={kept.state} />
      </p>
      {kept.state === "refused" && (
        <p>{Object.values(kept.errors ?? {})[0] ?? refusalWords[kept.reason]}</p>
      )}
      {bikes && mayDiscard(kept, bike !== undefined) && (
        <>
          {!bike && <p>Its bike is no longer on this phone.</p>}
          <Button onClick={() => setDiscarding(true)}>Discard</Button>
        </>
      )}
      {discarding && <DiscardSheet kept={kept} what={what} onClose={() => setDiscarding(false)} />}
    </li>
  );
}
