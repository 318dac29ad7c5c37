import { useState } from "react";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { requestPasswordReset } from "./auth-calls.ts";
import { EmailField } from "./email-field.tsx";

export default function ForgotPage() {
  const [email, setEmail] = useState("");
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await requestPasswordReset(email);
    setSentTo(email);
  });
  return (
    <Page
      title="A new password"
      back={{ to: patterns.signIn, label: "Sign in" }}
      action={
        <Button type="submit" form="forgot" look="primary" wide disabled={busy}>
          Send me a link
        </Button>
      }
    >
      <p>We send a link to your address; it lets you choose a new password.</p>
      <Form id="forgot" onSubmit={submit} problem={problem}>
        <EmailField value={email} onChange={setEmail} error={errors.email} />
      </Form>
      <div role="status">
        {sentTo && (
          <Notice tone="info" title="Look in your mail">
            <p>
              If there is an account for {sentTo}, a link is on its way to it. It works for 30
              minutes.
            </p>
          </Notice>
        )}
      </div>
    </Page>
  );
}
