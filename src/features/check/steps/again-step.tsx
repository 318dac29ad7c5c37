import { Navigate } from "react-router-dom";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Page } from "../../../ui/page.tsx";
import { furthestStep } from "../check-paths.ts";
import { mayAddRun, nextRun, readRuns } from "../draft/check-draft.ts";
import { FoundSequence } from "./found-sequence.tsx";
import { OneMoreRun } from "./one-more-run.tsx";
import { RunList } from "./run-list.tsx";
import { RunsNeeded } from "./runs-needed.tsx";
import { StepProgress } from "./step-progress.tsx";
import { UnkeptNotice } from "../unkept-notice.tsx";
import { useRun } from "./use-run.ts";

/** What the runs say so far, and whether one more is worth it. */
export function AgainStep() {
  const { n, exists, run, draft, paths, plan, unkept } = useRun();
  if (!exists || n > draft.runs.length) return <Navigate to={furthestStep(paths, draft)} replace />;
  const read = readRuns(draft).length;
  const enough = plan.runs !== null && read >= plan.runs;
  const next = nextRun(draft);
  const back = run.voided
    ? { to: paths.run(n), label: "The void run" }
    : { to: paths.read(n), label: "Read the level" };
  return (
    <Page
      title={titleOf(read, plan.runs)}
      back={back}
      action={
        <>
          {mayAddRun(draft) && (
            <ButtonLink look={enough ? "quiet" : "primary"} wide to={paths.run(next)}>
              {next <= draft.runs.length ? `Finish run ${next}` : "One more run"}
            </ButtonLink>
          )}
          {draft.runs.length > 0 && (
            <ButtonLink look={enough ? "primary" : "quiet"} wide to={paths.closeOut}>
              Done: close out
            </ButtonLink>
          )}
        </>
      }
    >
      <StepProgress at="Again or done" />
      <UnkeptNotice unkept={unkept} />
      <RunList />
      <FoundSequence n={n} />
      <OneMoreRun />
      {!enough && <RunsNeeded />}
    </Page>
  );
}

function titleOf(read: number, planned: number | null): string {
  if (planned !== null && read < planned) return `${read} of ${planned} runs read`;
  const counted = read === 1 ? "1 run read" : `${read} runs read`;
  return planned === null ? counted : `${counted}: enough`;
}
