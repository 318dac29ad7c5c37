import { Button } from "../../../ui/button.tsx";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { voidRun } from "../draft/check-draft.ts";
import { voidWords } from "../draft/check-entry.ts";
import { RunPage } from "./run-page.tsx";
import { useRun } from "./use-run.ts";

/** What became of a run that does not count; the tap that made it void can be taken back. */
export function VoidedRun() {
  const { n, run, change, paths } = useRun();
  return (
    <RunPage
      action={
        <>
          <ButtonLink look="primary" wide to={paths.run(n + 1)}>
            Do it again
          </ButtonLink>
          <ButtonLink wide to={paths.again(n)}>
            Enough runs
          </ButtonLink>
        </>
      }
    >
      <p role="status" className="text-2xl leading-tight font-bold">
        This run is void: {run.voided && voidWords[run.voided]}.
      </p>
      <p>It stays in the log and does not count.</p>
      <Button className="self-start" onClick={() => change((now) => voidRun(now, n, null))}>
        Count it after all
      </Button>
    </RunPage>
  );
}
