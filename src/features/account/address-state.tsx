import { useState } from "react";
import { Button } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { sendVerificationAgain } from "./account-calls.ts";
import { useMe } from "./use-me.ts";

/** Says that an address waits to be confirmed; nothing where it is, or where it is not known. */
export function AddressState() {
  const me = useMe().data;
  const [sent, setSent] = useState(false);
  const { submit, busy, problem } = useSubmit(async () => {
    await sendVerificationAgain();
    setSent(true);
  });
  if (!me || me.verified) return null;
  return (
    <div className="mt-2 flex flex-col gap-2">
      <p>
        This address is not confirmed yet: no reminders are sent to it, and no invitations to a club
        are mailed for you. Follow the link in the mail that you were sent.
      </p>
      {!sent && (
        <Button disabled={busy} onClick={() => void submit()}>
          Send the link again
        </Button>
      )}
      <div role="status">{sent && <Notice tone="info" title="A link is on its way" />}</div>
      {problem && <Notice tone="error" title={problem} />}
    </div>
  );
}
