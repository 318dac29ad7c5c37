import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useLinkToken } from "../../ui/use-link-token.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { resetPassword } from "./auth-calls.ts";
import { NewPasswordField } from "./new-password-field.tsx";

/** Where the mailed link leads: the token is in its address. */
export default function ResetPage() {
  const navigate = useNavigate();
  const token = useLinkToken();
  const [password, setPassword] = useState("");
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await resetPassword(token, password);
    await navigate(patterns.signIn, { replace: true });
  });
  const tokenProblem = errors.token ? "This link is not whole: open it again from the mail." : null;
  return (
    <Page
      title="Choose a new password"
      back={{ to: patterns.signIn, label: "Sign in" }}
      action={
        <Button type="submit" form="reset" look="primary" wide disabled={busy}>
          Save the new password
        </Button>
      }
    >
      <p>Every phone is then asked to sign in again. Nothing saved on them is lost.</p>
      <Form id="reset" onSubmit={submit} problem={problem ?? tokenProblem}>
        <NewPasswordField
          label="New password"
          value={password}
          onChange={setPassword}
          error={errors.password}
        />
      </Form>
    </Page>
  );
}
