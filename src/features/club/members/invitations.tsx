import { useState } from "react";
import type { Club, Invite } from "../../../../shared/schemas/club.ts";
import { Button } from "../../../ui/button.tsx";
import { formatDay } from "../../../ui/format-when.ts";
import { useSubmit } from "../../../ui/use-submit.ts";
import { AnswerNotice } from "../answer-notice.tsx";
import { revokeInvite } from "../club-calls.ts";
import { useInvites } from "../club-queries.ts";
import { useAskAnew } from "../use-kept-answer.ts";
import { InviteSheet } from "./invite-sheet.tsx";

/** The invitations still good, for an organiser. */
export function Invitations({ club }: { club: Club }) {
  const invites = useInvites(club.id);
  const [inviting, setInviting] = useState(false);
  return (
    <section aria-labelledby="invitations" className="flex flex-col gap-3">
      <h2 id="invitations" className="text-2xl">
        Invitations
      </h2>
      <AnswerNotice answer={invites} />
      {invites.data?.length === 0 && <p>None is open at present.</p>}
      {invites.data && invites.data.length > 0 && (
        <ul className="divide-y divide-rule border-y border-rule">
          {invites.data.map((invite) => (
            <InviteLine key={invite.id} clubId={club.id} invite={invite} />
          ))}
        </ul>
      )}
      <Button look="primary" onClick={() => setInviting(true)}>
        Invite
      </Button>
      {inviting && <InviteSheet club={club} onClose={() => setInviting(false)} />}
    </section>
  );
}

function InviteLine({ clubId, invite }: { clubId: string; invite: Invite }) {
  const { email, usesLeft, createdAt, expiresAt } = invite;
  const what = email ?? `Link of ${formatDay(createdAt)}`;
  const askAnew = useAskAnew();
  const { submit, busy, problem } = useSubmit(async () => {
    await revokeInvite(clubId, invite.id);
    await askAnew();
  });
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 py-2">
      <p className="min-w-0 flex-[1_1_12rem] leading-snug">
        <strong className="block wrap-anywhere">{what}</strong>
        <span className="text-soft">
          {usesLeft === 1 ? "One may join" : `${usesLeft} may join`}, until {formatDay(expiresAt)}
        </span>
        {problem && <span className="block font-bold text-low">{problem}</span>}
      </p>
      <Button aria-label={`Revoke: ${what}`} disabled={busy} onClick={() => void submit()}>
        Revoke
      </Button>
    </li>
  );
}
