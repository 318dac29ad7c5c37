import { useNavigate } from "react-router-dom";
import { useAccount, type BikeRecord } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Page } from "../../../ui/page.tsx";
import { Cautions } from "../cautions.tsx";
import { rememberCautionsRead } from "../cautions-read.ts";
import { stepPaths } from "../check-paths.ts";

/** Before the first run ever. */
export function CautionsStep({ record }: { record: BikeRecord }) {
  const paths = stepPaths(record.bikeId);
  const accountId = useAccount()?.id ?? "";
  const navigate = useNavigate();
  const goOn = () => {
    rememberCautionsRead(accountId);
    void navigate(paths.setUp);
  };
  return (
    <Page
      title="Before the first run"
      back={{ to: paths.start, label: "Delivery check" }}
      action={
        <Button look="primary" wide onClick={goOn}>
          I have read this: go on
        </Button>
      }
    >
      <Cautions />
    </Page>
  );
}
