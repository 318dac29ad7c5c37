import type { Club } from "../../../../shared/schemas/club.ts";
import { Page } from "../../../ui/page.tsx";
import { clubPath, patterns } from "../../../ui/paths.ts";
import { roleWords } from "../role-words.ts";
import { Invitations } from "./invitations.tsx";
import { LeaveClub } from "./leave-club.tsx";
import { MemberList } from "./member-list.tsx";
import { OwnBikes } from "./own-bikes.tsx";

/** A club as its members see it: who is in it, and what one shares with it. */
export function MembersPage({ club }: { club: Club }) {
  const back = club.mechanic
    ? { to: clubPath(club.id), label: "Line-up" }
    : { to: patterns.clubs, label: "Clubs" };
  return (
    <Page title={club.name} back={back}>
      <p className="-mt-3 text-soft">You: {roleWords(club).toLowerCase()}</p>
      <OwnBikes club={club} />
      <MemberList club={club} />
      {club.organiser && <Invitations club={club} />}
      <LeaveClub club={club} />
    </Page>
  );
}
