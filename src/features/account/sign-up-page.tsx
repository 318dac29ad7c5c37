import { useState } from "react";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { TextField } from "../../ui/text-field.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { signUp } from "./auth-calls.ts";
import { EmailField } from "./email-field.tsx";
import { NewPasswordField } from "./new-password-field.tsx";
import { useWayIn } from "./use-way-in.ts";

export default function SignUpPage() {
  const { goOn } = useWayIn();
  const [name, setName] = useState("");
  const [email, setEmail] = useState("");
  const [password, setPassword] = useState("");
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await signUp({ name, email, password });
    await goOn();
  });
  return (
    <Page
      title="Create an account"
      back={{ to: patterns.signIn, label: "Sign in" }}
      action={
        <Button type="submit" form="sign-up" look="primary" wide disabled={busy}>
          Create the account
        </Button>
      }
    >
      <p>
        It needs a network once. After that the app works with none, and sends what you logged when
        there is one.
      </p>
      <Form id="sign-up" onSubmit={submit} problem={problem}>
        <TextField
          label="Your name"
          hint="As it stands beside your entries."
          autoComplete="name"
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={errors.name}
        />
        <EmailField value={email} onChange={setEmail} error={errors.email} />
        <NewPasswordField
          label="Password"
          value={password}
          onChange={setPassword}
          error={errors.password}
        />
      </Form>
    </Page>
  );
}
