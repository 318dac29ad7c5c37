import { Route, Routes, useParams } from "react-router-dom";
import { useBike, useHoldUpdates } from "../../offline/index.ts";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { CheckSteps } from "./check-steps.tsx";
import { QuickPage } from "./quick/quick-page.tsx";
import { ResultPage } from "./result/result-page.tsx";
import { AgainStep } from "./steps/again-step.tsx";
import { CautionsStep } from "./steps/cautions-step.tsx";
import { CloseOutStep } from "./steps/close-out-step.tsx";
import { ReadStep } from "./steps/read-step.tsx";
import { RunStep } from "./steps/run-step.tsx";
import { SetUpStep } from "./steps/set-up-step.tsx";
import { StartPage } from "./start-page.tsx";

const backToShed = { to: patterns.shed, label: "Shed" };

/** The delivery check of one bike: the guided one step a screen, the quick form, and the result. */
export default function CheckPage() {
  const { bikeId = "" } = useParams();
  const { data: bike, error, isFetching } = useBike(bikeId);
  useHoldUpdates();
  if (error)
    return (
      <Page title="This bike cannot be shown" back={backToShed}>
        <Notice tone="error" title={error.message} />
      </Page>
    );
  if (bike === undefined) return <main className="flex-1" aria-busy />;
  if (bike === null)
    return (
      <Page title="This bike is not here" back={backToShed}>
        <p>This phone has no bike at this address. It may not have reached this phone yet.</p>
      </Page>
    );
  return (
    <div className="flex flex-1 flex-col [--target:56px]">
      <Routes>
        <Route index element={<StartPage bike={bike} />} />
        <Route path="quick" element={<QuickPage bike={bike} />} />
        <Route path="result/:entryId" element={<ResultPage bike={bike} reading={isFetching} />} />
        <Route path="cautions" element={<CautionsStep record={bike.record} />} />
        <Route path="close-out" element={<CloseOutStep record={bike.record} />} />
        <Route element={<CheckSteps record={bike.record} />}>
          <Route path="set-up" element={<SetUpStep />} />
          <Route path="run/:n" element={<RunStep />} />
          <Route path="read/:n" element={<ReadStep />} />
          <Route path="again/:n" element={<AgainStep />} />
        </Route>
        <Route path="*" element={<StartPage bike={bike} />} />
      </Routes>
    </div>
  );
}
