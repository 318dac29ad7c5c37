import { discardRefused } from "../../offline/discard-refused.ts";
import type { KeptEntry } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { formatWhen } from "../../ui/format-when.ts";
import { Notice } from "../../ui/notice.tsx";
import { asJson, saveFile } from "../../ui/save-file.ts";
import { Sheet } from "../../ui/sheet.tsx";
import { useSubmit } from "../../ui/use-submit.ts";

interface Props {
  kept: KeptEntry;
  /** The entry in words. */
  what: string;
  onClose: () => void;
}

/** Asks, and offers the entry as a file first: there is no other copy of it. */
export function DiscardSheet({ kept: { entry }, what, onClose }: Props) {
  const { submit, busy, problem } = useSubmit(async () => {
    await discardRefused(entry.id);
    onClose();
  });
  return (
    <Sheet title="Discard this entry?" onClose={onClose}>
      <div className="flex flex-col gap-4">
        <p className="font-bold">
          {what}, {formatWhen(entry.at)}
        </p>
        <p>
          The server does not have it, and once it is discarded this phone does not either. To keep
          it, or to hand it to the bike’s owner, save it as a file first.
        </p>
        <Button wide onClick={() => saveFile(asJson(entry), `entry-${entry.id}.json`)}>
          Save it as a file
        </Button>
        {problem && <Notice tone="error" title={problem} />}
        <Button wide onClick={onClose}>
          Leave it here
        </Button>
        <Button look="danger" wide disabled={busy} onClick={() => void submit()}>
          Discard it for good
        </Button>
      </div>
    </Sheet>
  );
}
