import { useState } from "react";
import { useSearchParams } from "react-router-dom";
import { ApiError, apiRequest } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { FieldErrors, useSubmit } from "../../ui/use-submit.ts";

/** These links do not run out: one that is not known has lost a letter, or its account is gone. */
async function endReminders(token: string): Promise<void> {
  try {
    await apiRequest(`/api/unsubscribe?token=${encodeURIComponent(token)}`, { method: "POST" });
  } catch (error) {
    const unknown = error instanceof ApiError && [404, 422].includes(error.status);
    if (!unknown) throw error;
    throw new FieldErrors({ token: "This link is not whole: open it again from the mail." });
  }
}

/** Where the foot of a reminder leads: a press ends them, signed in or not, and not the visit. */
export default function UnsubscribePage() {
  const token = useSearchParams()[0].get("token") ?? "";
  const [ended, setEnded] = useState(false);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await endReminders(token);
    setEnded(true);
  });
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
      <Form id="unsubscribe" onSubmit={submit} problem={problem ?? errors.token ?? null}>
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
