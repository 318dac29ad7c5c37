import { useParams } from "react-router-dom";
import { useBike } from "../../../offline/index.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Page } from "../../../ui/page.tsx";
import { bikePath, patterns } from "../../../ui/paths.ts";
import { AnswerNotice } from "../answer-notice.tsx";
import { useClubs } from "../club-queries.ts";
import { ShareCard } from "./share-card.tsx";
import { useShares } from "./use-shares.ts";
import { WhatIsShared } from "./what-is-shared.tsx";

/** Who sees a bike: its owner's to say, club by club, and to take back at any time. */
export default function SharePage() {
  const { bikeId = "" } = useParams();
  const { data: bike } = useBike(bikeId);
  const clubs = useClubs();
  const shares = useShares(bikeId);
  if (bike === undefined) return <main className="flex-1" aria-busy />;
  if (bike?.record.access !== "owner")
    return (
      <Page title="There is nothing at this address" back={{ to: patterns.shed, label: "Shed" }}>
        <p>Only the owner of a bike says who sees it.</p>
      </Page>
    );
  const { name } = bike.record.details;
  return (
    <Page title={`Who sees ${name}`} back={{ to: bikePath(bikeId), label: name }}>
      <AnswerNotice answer={clubs.error ? clubs : shares} />
      {clubs.data?.length === 0 && <NoClub />}
      {clubs.data && shares.data && (
        <ul className="flex flex-col gap-4">
          {clubs.data.map((club) => (
            <li key={club.id}>
              <ShareCard
                bikeId={bikeId}
                club={club}
                share={shares.data.find((share) => share.club.id === club.id) ?? null}
              />
            </li>
          ))}
        </ul>
      )}
      <WhatIsShared />
    </Page>
  );
}

function NoClub() {
  return (
    <>
      <p className="text-lg">
        Nobody but you. A bike can be shared with a club that you are in: its mechanics then see how
        the pump is doing, and can log checks for you.
      </p>
      <ButtonLink look="primary" to={patterns.clubs}>
        Clubs
      </ButtonLink>
    </>
  );
}
