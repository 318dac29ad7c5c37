import { useState } from "react";
import { useAccount } from "../../offline/index.ts";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Choice } from "../../ui/choice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { chooseTheme, chosenTheme } from "../../ui/theme-choice.ts";
import { AddressState } from "./address-state.tsx";
import { ReminderChoice } from "./reminder-choice.tsx";
import { OnThisPhone } from "./on-this-phone.tsx";
import { SignOut } from "./sign-out.tsx";

export default function AccountPage() {
  const account = useAccount();
  if (!account) return null;
  return (
    <Page title="Account" back={{ to: patterns.shed, label: "Shed" }}>
      <div>
        <p className="text-xl font-bold wrap-anywhere">{account.name}</p>
        <p className="text-soft wrap-anywhere">{account.email}</p>
        <AddressState />
      </div>
      <ThemeChoice />
      <section className="flex flex-col gap-2 border-t border-rule pt-4">
        <h2 className="text-xl">Syringes</h2>
        <p>What you measure with; a check names one, so that its marks are known.</p>
        <ButtonLink to={patterns.syringes}>My syringes</ButtonLink>
      </section>
      <ReminderChoice />
      <OnThisPhone />
      <section className="flex flex-col gap-2 border-t border-rule pt-4">
        <h2 className="text-xl">Signing in</h2>
        <ButtonLink to={patterns.devices}>Devices signed in</ButtonLink>
        <ButtonLink to={patterns.changePassword}>Change the password</ButtonLink>
        <ButtonLink to={patterns.changeEmail}>Change the e-mail address</ButtonLink>
      </section>
      <section className="flex flex-col gap-2 border-t border-rule pt-4">
        <h2 className="text-xl">My data</h2>
        <ButtonLink to={patterns.ownData}>Take it along as a file</ButtonLink>
        <ButtonLink to={patterns.deleteAccount}>Delete the account</ButtonLink>
      </section>
      <SignOut />
    </Page>
  );
}

function ThemeChoice() {
  const [theme, setTheme] = useState(chosenTheme);
  return (
    <Choice
      label="Light or dark"
      options={[
        { value: "system", label: "System" },
        { value: "light", label: "Light" },
        { value: "dark", label: "Dark" },
      ]}
      value={theme}
      onChange={(choice) => {
        chooseTheme(choice);
        setTheme(choice);
      }}
    />
  );
}
