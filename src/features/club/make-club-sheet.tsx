import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { Button } from "../../ui/button.tsx";
import { Form } from "../../ui/form.tsx";
import { membersPath } from "../../ui/paths.ts";
import { Sheet } from "../../ui/sheet.tsx";
import { TextField } from "../../ui/text-field.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { makeClub } from "./club-calls.ts";
import { useAskAnew } from "./use-kept-answer.ts";

export function MakeClubSheet({ onClose }: { onClose: () => void }) {
  const [name, setName] = useState("");
  const askAnew = useAskAnew();
  const navigate = useNavigate();
  const { submit, busy, errors, problem } = useSubmit(async () => {
    const club = await makeClub(name);
    await askAnew();
    await navigate(membersPath(club.id));
  });
  return (
    <Sheet title="Make a club" onClose={onClose}>
      <Form onSubmit={submit} problem={problem}>
        <TextField
          label="Name of the club"
          hint="You are its organiser: you invite people, and say who is a mechanic."
          autoComplete="off"
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={errors.name}
        />
        <Button type="submit" look="primary" wide disabled={busy}>
          Make the club
        </Button>
      </Form>
    </Sheet>
  );
}
