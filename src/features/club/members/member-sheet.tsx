import { useState } from "react";
import type { Club, Member } from "../../../../shared/schemas/club.ts";
import { useAccount } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Form } from "../../../ui/form.tsx";
import { Sheet } from "../../../ui/sheet.tsx";
import { Tick } from "../../../ui/tick.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { giveRoles } from "../club-calls.ts";
import { useAskAnew } from "../use-kept-answer.ts";
import { RemoveMember } from "./remove-member.tsx";

interface Props {
  club: Club;
  member: Member;
  onClose: () => void;
}

/** What a member does in the club, for an organiser to say. */
export function MemberSheet({ club, member, onClose }: Props) {
  const [roles, setRoles] = useState({ organiser: member.organiser, mechanic: member.mechanic });
  const me = useAccount()?.id === member.id;
  const askAnew = useAskAnew();
  const { submit, busy, problem } = useSubmit(async () => {
    await giveRoles(club.id, member.id, roles);
    await askAnew();
    onClose();
  });
  return (
    <Sheet title={member.name} onClose={onClose}>
      <Form onSubmit={submit} problem={problem}>
        <div>
          <Tick
            checked={roles.mechanic}
            onChange={(mechanic) => setRoles((now) => ({ ...now, mechanic }))}
          >
            <strong className="block">Mechanic</strong>
            Sees the shared bikes, logs checks for them, advises their owners.
          </Tick>
          <Tick
            checked={roles.organiser}
            onChange={(organiser) => setRoles((now) => ({ ...now, organiser }))}
          >
            <strong className="block">Organiser</strong>
            Invites, gives and takes these roles, removes members.
          </Tick>
        </div>
        <Button type="submit" look="primary" wide disabled={busy}>
          Save
        </Button>
      </Form>
      {!me && <RemoveMember club={club} member={member} onRemoved={onClose} />}
    </Sheet>
  );
}
