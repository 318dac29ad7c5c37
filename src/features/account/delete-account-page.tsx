import { useState } from "react";
import { eraseFromPhone, useSyncStatus } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { Tick } from "../../ui/tick.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { deleteAccount } from "./account-calls.ts";
import { ExportButtons } from "./export-buttons.tsx";
import { leaveThisPhone } from "./leave-this-phone.ts";
import { PasswordField } from "./password-field.tsx";

export default function DeleteAccountPage() {
  const { unsent } = useSyncStatus();
  const [sure, setSure] = useState(false);
  const [password, setPassword] = useState("");
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await deleteAccount(password);
    await eraseFromPhone();
    leaveThisPhone("deleted");
  });
  return (
    <Page
      title="Delete the account"
      back={{ to: patterns.account, label: "Account" }}
      action={
        <Button type="submit" form="delete" look="danger" wide disabled={busy || !sure}>
          Delete the account and its bikes
        </Button>
      }
    >
      <ul className="list-disc space-y-1 pl-5">
        <li>Your bikes and their logs are erased, on the server and on this phone.</li>
        <li>What you wrote in the logs of other people’s bikes stays, without your name.</li>
        <li>You leave your clubs. Nobody can undo this, whoever runs this logbook included.</li>
      </ul>
      <section className="flex flex-col gap-2 border-t border-rule pt-4">
        <h2 className="text-xl">First, take your data along</h2>
        {unsent > 0 && (
          <Notice tone="caution" title="Some entries were never sent">
            <p>They are not in these files. Send them first, or save them on the account’s page.</p>
          </Notice>
        )}
        <ExportButtons />
      </section>
      <section className="flex flex-col gap-2 border-t border-rule pt-4">
        <h2 className="text-xl">Then delete it</h2>
        <Form id="delete" onSubmit={submit} problem={problem}>
          <PasswordField
            label="Your password"
            autoComplete="current-password"
            value={password}
            onChange={setPassword}
            error={errors.password}
          />
          <Tick checked={sure} onChange={setSure}>
            Erase all of it, for good
          </Tick>
        </Form>
      </section>
    </Page>
  );
}
