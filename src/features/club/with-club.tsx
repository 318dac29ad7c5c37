import type { ReactNode } from "react";
import { useParams } from "react-router-dom";
import type { Club } from "../../../shared/schemas/club.ts";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { AnswerNotice } from "./answer-notice.tsx";
import { useClubs } from "./club-queries.ts";

const backToClubs = { to: patterns.clubs, label: "Clubs" };

/** The club that the address names, as the server last told of it. */
export function WithClub({ children }: { children: (club: Club) => ReactNode }) {
  const { clubId } = useParams();
  const clubs = useClubs();
  const club = clubs.data?.find(({ id }) => id === clubId);
  if (club) return children(club);
  if (clubs.data === undefined && !clubs.error) return <main className="flex-1" aria-busy />;
  return (
    <Page title="This club is not here" back={backToClubs}>
      {clubs.error ? (
        <AnswerNotice answer={clubs} />
      ) : (
        <p>You are in no club at this address. You may have left it, or it was closed.</p>
      )}
    </Page>
  );
}
