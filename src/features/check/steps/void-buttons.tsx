import { Button } from "../../../ui/button.tsx";
import { voidRun } from "../draft/check-draft.ts";
import { voidReasons, type VoidReason } from "../draft/check-draft-schema.ts";
import { useRun } from "./use-run.ts";

const words: Record<VoidReason, string> = {
  "not-started": "Did not start",
  interrupted: "Interrupted",
  doubled: "Ran twice",
};

/** One tap makes a run void: it stays recorded, and does not count. */
export function VoidButtons({ only = voidReasons }: { only?: readonly VoidReason[] }) {
  const { n, change } = useRun();
  return (
    <fieldset className="flex min-w-0 flex-wrap gap-2">
      <legend className="mb-1 font-bold">Make this run void</legend>
      {only.map((reason) => (
        <Button
          key={reason}
          className="flex-1 px-2!"
          onClick={() => change((now) => voidRun(now, n, reason))}
        >
          {words[reason]}
        </Button>
      ))}
    </fieldset>
  );
}
