import { Button } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { saveFile } from "../../ui/save-file.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { exportChecks, exportEverything } from "./account-calls.ts";

/** Files of one's own data: everything, or the checks alone for a spreadsheet. */
export function ExportButtons() {
  const all = useSubmit(async () => saveFile(await exportEverything(), "sumpless.json"));
  const checks = useSubmit(async () => saveFile(await exportChecks(), "sumpless-checks.csv"));
  const problem = all.problem ?? checks.problem;
  return (
    <div className="flex flex-col gap-2">
      <Button disabled={all.busy} onClick={() => void all.submit()}>
        Save everything (JSON)
      </Button>
      <Button disabled={checks.busy} onClick={() => void checks.submit()}>
        Save the checks (CSV)
      </Button>
      {problem && <Notice tone="error" title={problem} />}
    </div>
  );
}
