import { useState } from "react";
import { useAccount } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { changePassword } from "./account-calls.ts";
import { NewPasswordField } from "./new-password-field.tsx";
import { PasswordField } from "./password-field.tsx";

const blank = { password: "", newPassword: "" };

export default function ChangePasswordPage() {
  const email = useAccount()?.email;
  const [typed, setTyped] = useState(blank);
  const [changed, setChanged] = useState(false);
  const { submit, busy, errors, problem } = useSubmit(async () => {
    setChanged(false);
    await changePassword(typed);
    setTyped(blank);
    setChanged(true);
  });
  return (
    <Page
      title="Change the password"
      back={{ to: patterns.account, label: "Account" }}
      action={
        <Button type="submit" form="change-password" look="primary" wide disabled={busy}>
          Save the new password
        </Button>
      }
    >
      <p>Every other device is then asked to sign in again. Nothing saved on them is lost.</p>
      <Form id="change-password" onSubmit={submit} problem={problem}>
        {/* For whatever keeps passwords: it must know whose this is. */}
        <input hidden readOnly autoComplete="username" value={email ?? ""} />
        <PasswordField
          label="Present password"
          autoComplete="current-password"
          value={typed.password}
          onChange={(password) => setTyped({ ...typed, password })}
          error={errors.password}
        />
        <NewPasswordField
          label="New password"
          value={typed.newPassword}
          onChange={(newPassword) => setTyped({ ...typed, newPassword })}
          error={errors.newPassword}
        />
      </Form>
      <div role="status">
        {changed && (
          <Notice tone="info" title="The new password counts from now on">
            <p>Every other device is signed out.</p>
          </Notice>
        )}
      </div>
    </Page>
  );
}
