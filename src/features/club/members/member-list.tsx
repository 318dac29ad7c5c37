import { useState } from "react";
import type { Club, Member } from "../../../../shared/schemas/club.ts";
import { useAccount } from "../../../offline/index.ts";
import { formatDay } from "../../../ui/format-when.ts";
import { OnwardIcon } from "../../../ui/icons.tsx";
import { AnswerNotice } from "../answer-notice.tsx";
import { useMembers } from "../club-queries.ts";
import { roleWords } from "../role-words.ts";
import { MemberSheet } from "./member-sheet.tsx";

/** Whom one may know of; an organiser gives roles and removes members here. */
export function MemberList({ club }: { club: Club }) {
  const members = useMembers(club.id);
  const [open, setOpen] = useState<Member | null>(null);
  return (
    <section aria-labelledby="members" className="flex flex-col gap-2">
      <h2 id="members" className="text-2xl">
        Members
      </h2>
      {!club.organiser && <p>You see its organisers and mechanics. Organisers see all members.</p>}
      <AnswerNotice answer={members} />
      <ul className="divide-y divide-rule border-y border-rule">
        {members.data?.map((member) => (
          <li key={member.id}>
            {club.organiser ? (
              <button
                type="button"
                onClick={() => setOpen(member)}
                className="flex min-h-target w-full items-center gap-3 py-2 text-left"
              >
                <MemberLine member={member} />
                <OnwardIcon className="shrink-0 text-oil" />
              </button>
            ) : (
              <div className="flex min-h-target items-center gap-3 py-2">
                <MemberLine member={member} />
              </div>
            )}
          </li>
        ))}
      </ul>
      {open && <MemberSheet club={club} member={open} onClose={() => setOpen(null)} />}
    </section>
  );
}

function MemberLine({ member }: { member: Member }) {
  const me = useAccount()?.id === member.id;
  return (
    <span className="min-w-0 flex-1 leading-snug">
      <span className="block text-lg font-bold wrap-anywhere">
        {member.name}
        {me && " (you)"}
      </span>
      <span className="text-soft">
        {roleWords(member)}, since {formatDay(member.joinedAt)}
      </span>
    </span>
  );
}
