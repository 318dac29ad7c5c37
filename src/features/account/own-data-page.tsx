import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { ExportButtons } from "./export-buttons.tsx";

export default function OwnDataPage() {
  return (
    <Page title="My data" back={{ to: patterns.account, label: "Account" }}>
      <p>
        Everything that the server keeps of you: your account, devices and clubs, your bikes with
        every entry in their logs, and what you wrote in the logs of others.
      </p>
      <p>The checks alone, one a line, are for a spreadsheet.</p>
      <ExportButtons />
    </Page>
  );
}
