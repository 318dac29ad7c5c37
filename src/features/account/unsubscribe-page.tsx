import { useState } from "react";
import { useSearchParams } from "react-router-dom";
import { apiRequest } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";

/** Where the foot of a reminder leads: a press ends them, signed in or not, and not the visit. */
export default function UnsubscribePage() {
  const token = useSearchParams()[0].get("token") ?? "";
  const [ended, setEnded] = useState(false);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await apiRequest(`/api/unsubscribe?token=${encodeURIComponent(token)}`, { method: "POST" });
    setEnded(true);
  });
  const tokenProblem = errors.token ? "This link is not whole: open it again from the mail." : null;
  const action = ended ? (
    <ButtonLink look="primary" wide to={patterns.account}>
      Go to the account
    </ButtonLink>
  ) : (
    <Button type="submit" form="unsubscribe" look="primary" wide disabled={busy}>
      Send me no more of these
    </Button>
  );
  return (
    <Page title="End these reminders" action={action}>
      <Form id="unsubscribe" onSubmit={submit} problem={problem ?? tokenProblem}>
        <p>The app itself goes on showing when a check is due, and what a pump was found to be.</p>
      </Form>
      <div role="status">
        {ended && (
          <Notice tone="info" title="You get no more of them">
            <p>On the account’s page they can be asked for again.</p>
          </Notice>
        )}
      </div>
    </Page>
  );
}
