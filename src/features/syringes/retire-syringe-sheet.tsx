import { retireSyringe, type Syringe } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Sheet } from "../../ui/sheet.tsx";
import { useSubmit } from "../../ui/use-submit.ts";

interface Props {
  syringe: Syringe;
  onClose: () => void;
}

export function RetireSyringeSheet({ syringe, onClose }: Props) {
  const { submit, busy, problem } = useSubmit(async () => {
    await retireSyringe(syringe);
    onClose();
  });
  return (
    <Sheet title={`Retire ${syringe.label}?`} onClose={onClose}>
      <div className="flex flex-col gap-4">
        <p>
          It is no longer offered for a check. The checks made with it keep it. A new syringe in its
          place is another one: add it anew.
        </p>
        {problem && <Notice tone="error" title={problem} />}
        <Button look="primary" wide disabled={busy} onClick={() => void submit()}>
          Retire it
        </Button>
        <Button wide onClick={onClose}>
          Keep it
        </Button>
      </div>
    </Sheet>
  );
}
