import { useState } from "react";
import { Link, useSearchParams } from "react-router-dom";
import { useAccount } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Column } from "../../ui/column.tsx";
import { usualScale } from "../../ui/column-scale.ts";
import { Form } from "../../ui/form.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { signIn } from "./auth-calls.ts";
import { EmailField } from "./email-field.tsx";
import { leftWordsIn } from "./leave-this-phone.ts";
import { PasswordField } from "./password-field.tsx";
import { useWayIn } from "./use-way-in.ts";

export default function SignInPage() {
  const { state, goOn } = useWayIn();
  const left = leftWordsIn(useSearchParams()[0]);
  const [email, setEmail] = useState(useAccount()?.email ?? "");
  const [password, setPassword] = useState("");
  const { submit, busy, errors, problem } = useSubmit(async () => {
    await signIn({ email, password });
    await goOn();
  });
  return (
    <Page
      title="Sign in"
      action={
        <>
          <Button type="submit" form="sign-in" look="primary" wide disabled={busy}>
            Sign in
          </Button>
          <ButtonLink to={patterns.signUp} state={state} wide>
            I am new here
          </ButtonLink>
        </>
      }
    >
      <div className="flex items-center justify-between gap-4">
        <p className="text-xl text-balance">
          A two-stroke has no sump to fall back on. Sumpless is the logbook that tells you the oil
          pump is still keeping up.
        </p>
        <div aria-hidden>
          <Column
            size="small"
            scale={usualScale(3)}
            readingMl={2.9}
            uMl={0.05}
            baselineMl={3}
            limitMl={2.55}
          />
        </div>
      </div>
      <div role="status">{left && <Notice tone="info" title={left} />}</div>
      <Form id="sign-in" onSubmit={submit} problem={problem}>
        <EmailField value={email} onChange={setEmail} error={errors.email} />
        <PasswordField
          label="Password"
          autoComplete="current-password"
          value={password}
          onChange={setPassword}
          error={errors.password}
        />
      </Form>
      <Link
        to={patterns.forgot}
        className="inline-flex min-h-target items-center self-start font-bold text-oil underline"
      >
        I forgot my password
      </Link>
    </Page>
  );
}
