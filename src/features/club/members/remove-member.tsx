import type { Club, Member } from "../../../../shared/schemas/club.ts";
import { Button } from "../../../ui/button.tsx";
import { Fold } from "../../../ui/fold.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { removeMember } from "../club-calls.ts";
import { useAskAnew } from "../use-kept-answer.ts";

interface Props {
  club: Club;
  member: Member;
  onRemoved: () => void;
}

export function RemoveMember({ club, member, onRemoved }: Props) {
  const askAnew = useAskAnew();
  const { submit, busy, problem } = useSubmit(async () => {
    await removeMember(club.id, member.id);
    await askAnew();
    onRemoved();
  });
  return (
    <div className="mt-4 border-t border-rule pt-2">
      <Fold title="Remove from the club">
        <div className="flex flex-col gap-3">
          <p>
            The bikes of {member.name} leave the Line-up. What was logged on them stays in their
            logs.
          </p>
          <p>
            All open invitations of the club end, so that {member.name} cannot come back by one of
            them, those mailed to others too: make new ones for them.
          </p>
          {problem && <Notice tone="error" title={problem} />}
          <Button look="danger" wide disabled={busy} onClick={() => void submit()}>
            Remove {member.name}
          </Button>
        </div>
      </Fold>
    </div>
  );
}
