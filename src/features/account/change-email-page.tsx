import { useState } from "react";
import { useAccount } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { changeEmail } from "./account-calls.ts";
import { EmailField } from "./email-field.tsx";
import { PasswordField } from "./password-field.tsx";

export default function ChangeEmailPage() {
  const present = useAccount()?.email;
  const [email, setEmail] = useState("");
  const [password, setPassword] = useState("");
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await changeEmail({ email, password });
    setSentTo(email);
    setPassword("");
  });
  return (
    <Page
      title="Change the address"
      back={{ to: patterns.account, label: "Account" }}
      action={
        <Button type="submit" form="change-email" look="primary" wide disabled={busy}>
          Send a link to the new address
        </Button>
      }
    >
      <p className="wrap-anywhere">
        Now it is {present}. It stays until you follow the link that is sent to the new one.
      </p>
      <Form id="change-email" onSubmit={submit} problem={problem}>
        <EmailField
          label="New e-mail"
          autoComplete="email"
          value={email}
          onChange={setEmail}
          error={errors.email}
        />
        <PasswordField
          label="Your password"
          autoComplete="current-password"
          value={password}
          onChange={setPassword}
          error={errors.password}
        />
      </Form>
      <div role="status">
        {sentTo && (
          <Notice tone="info" title="Look in your mail">
            <p className="wrap-anywhere">
              A link is on its way to {sentTo}. It works for a day. Your present address is told
              too.
            </p>
          </Notice>
        )}
      </div>
    </Page>
  );
}
