import { Button } from "../../../ui/button.tsx";
import { voidRun } from "../draft/check-draft.ts";
import { voidReasons, type VoidReason } from "../draft/check-draft-schema.ts";
import { useRun } from "./use-run.ts";

const words: Record<VoidReason, string> = {
  "not-started": "It did not start",
  interrupted: "It was interrupted",
  doubled: "It ran twice",
};

/** One tap makes a run void: it stays recorded, and does not count. */
export function VoidButtons({ only = voidReasons }: { only?: readonly VoidReason[] }) {
  const { n, change } = useRun();
  return (
    <div role="group" aria-label="Make this run void" className="flex flex-wrap gap-2">
      {only.map((reason) => (
        <Button
          key={reason}
          className="flex-1"
          onClick={() => change((now) => voidRun(now, n, reason))}
        >
          {words[reason]}
        </Button>
      ))}
    </div>
  );
}
