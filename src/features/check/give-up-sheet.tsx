import { Button } from "../../ui/button.tsx";
import { Sheet } from "../../ui/sheet.tsx";

interface Props {
  hoseMaybeOff: boolean;
  onGiveUp: () => void;
  onClose: () => void;
}

/** Asks before a half-done check is thrown away. */
export function GiveUpSheet({ hoseMaybeOff, onGiveUp, onClose }: Props) {
  return (
    <Sheet title="Give this check up?" onClose={onClose}>
      <div className="flex flex-col gap-4">
        <p>
          What was read so far is thrown away.
          {hoseMaybeOff &&
            " The Shed goes on saying that the hose may be off, until you tick the close-out."}
        </p>
        <Button look="danger" wide onClick={onGiveUp}>
          Give it up
        </Button>
        <Button wide onClick={onClose}>
          Keep it
        </Button>
      </div>
    </Sheet>
  );
}
