import { useState } from "react";
import { Button } from "../../ui/button.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useLinkToken } from "../../ui/use-link-token.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { verifyEmail } from "./auth-calls.ts";

/** A press confirms, not the visit: mail scanners visit links too, and the link works once. */
export default function VerifyPage() {
  const token = useLinkToken();
  const [confirmed, setConfirmed] = useState(false);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await verifyEmail(token);
    setConfirmed(true);
  });
  const tokenProblem = errors.token ? "This link is not whole: open it again from the mail." : null;
  const action = confirmed ? (
    <ButtonLink look="primary" wide to={patterns.shed}>
      Go to the Shed
    </ButtonLink>
  ) : (
    <Button type="submit" form="verify" look="primary" wide disabled={busy}>
      Yes, this is my address
    </Button>
  );
  return (
    <Page title="Confirm your e-mail address" action={action}>
      <Form id="verify" onSubmit={submit} problem={problem ?? tokenProblem}>
        <p>Reminders are sent only to an address that its owner has confirmed.</p>
      </Form>
      <div role="status">{confirmed && <Notice tone="info" title="Confirmed, thank you" />}</div>
    </Page>
  );
}
