import { useState } from "react";
import { saveEntry, useHoldUpdates, type KeptEntry } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Form } from "../../../ui/form.tsx";
import { formatWhen } from "../../../ui/format-when.ts";
import { Sheet } from "../../../ui/sheet.tsx";
import { TextArea } from "../../../ui/text-area.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { kindWords } from "../../../ui/words.ts";

interface Props {
  kept: KeptEntry;
  onClose: () => void;
}

/** Asks why an entry is struck: it stays in the log, ruled through, with the reason beside it. */
export function StrikeSheet({ kept, onClose }: Props) {
  useHoldUpdates();
  const [reason, setReason] = useState("");
  const { entry } = kept;
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await saveEntry({
      bikeId: entry.bikeId,
      kind: "strike",
      at: new Date().toISOString(),
      hours: null,
      body: { entryId: entry.id, reason: reason.trim() },
    });
    onClose();
  });
  return (
    <Sheet title="Strike this entry?" onClose={onClose}>
      <Form onSubmit={submit} problem={problem}>
        {kept.understood && (
          <p className="font-bold">
            {kindWords[kept.entry.kind]}, {formatWhen(entry.at)}
          </p>
        )}
        <p>
          It no longer counts, and stays in the log, ruled through. It cannot be brought back: write
          it down anew if it was right after all.
        </p>
        <TextArea
          label="What was wrong with it?"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={errors["body.reason"]}
        />
        <Button type="submit" look="danger" wide disabled={busy}>
          Strike it
        </Button>
      </Form>
    </Sheet>
  );
}
