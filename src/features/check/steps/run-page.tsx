import type { ReactNode } from "react";
import { Page } from "../../../ui/page.tsx";
import { StepProgress } from "./step-progress.tsx";
import { UnkeptNotice } from "../unkept-notice.tsx";
import { useRun } from "./use-run.ts";

interface Props {
  action: ReactNode;
  children: ReactNode;
}

/** The frame of every stage of a run. */
export function RunPage({ action, children }: Props) {
  const { n, name, paths, unkept } = useRun();
  const back =
    n === 1
      ? { to: paths.setUp, label: "Set up" }
      : { to: paths.again(n - 1), label: "Again or done" };
  return (
    <Page title={name} back={back} action={action}>
      <StepProgress at="Run" />
      <UnkeptNotice unkept={unkept} />
      {children}
    </Page>
  );
}
