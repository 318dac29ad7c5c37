import { useState } from "react";
import {
  MAX_INVITE_DAYS,
  MAX_INVITE_USES,
  type Club,
  type NewInviteResponse,
} from "../../../../shared/schemas/club.ts";
import { Button } from "../../../ui/button.tsx";
import { Form } from "../../../ui/form.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { Sheet } from "../../../ui/sheet.tsx";
import { TextField } from "../../../ui/text-field.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { makeInvite } from "../club-calls.ts";
import { useAskAnew } from "../use-kept-answer.ts";
import { MadeInvite } from "./made-invite.tsx";

interface Props {
  club: Club;
  onClose: () => void;
}

/** How many may join by an invitation, and until when; then its link and code. */
export function InviteSheet({ club, onClose }: Props) {
  const [uses, setUses] = useState("1");
  const [days, setDays] = useState("14");
  const [email, setEmail] = useState("");
  const [made, setMade] = useState<NewInviteResponse | null>(null);
  const askAnew = useAskAnew();
  const { submit, busy, errors, problem } = useSubmit(async () => {
    const answer = await makeInvite(club.id, {
      email: email.trim() || undefined,
      uses: parseDecimal(uses) ?? NaN,
      days: parseDecimal(days) ?? NaN,
    });
    await askAnew();
    setMade(answer);
  });
  if (made)
    return (
      <Sheet key="made" title={`Join ${club.name}`} onClose={onClose}>
        <MadeInvite made={made} wantedMailed={email.trim() !== ""} />
      </Sheet>
    );
  return (
    <Sheet key="make" title={`Invite to ${club.name}`} onClose={onClose}>
      <Form onSubmit={submit} problem={problem}>
        <NumberField
          label="How many may join by it"
          error={errors.uses}
          value={uses}
          onChange={setUses}
          step={1}
          min={1}
          max={MAX_INVITE_USES}
        />
        <NumberField
          label="Good for"
          error={errors.days}
          value={days}
          onChange={setDays}
          step={1}
          min={1}
          max={MAX_INVITE_DAYS}
          unit="days"
        />
        <TextField
          label="E-mail it to"
          hint="May be left empty: you are given a link and its code to hand over."
          type="email"
          inputMode="email"
          autoComplete="off"
          autoCapitalize="none"
          value={email}
          onChange={(event) => setEmail(event.target.value)}
          error={errors.email}
        />
        <Button type="submit" look="primary" wide disabled={busy}>
          Make the invitation
        </Button>
      </Form>
    </Sheet>
  );
}
