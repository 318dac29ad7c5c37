import { useState } from "react";
import type { Club } from "../../../shared/schemas/club.ts";
import { Button } from "../../ui/button.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Card } from "../../ui/card.tsx";
import { Page } from "../../ui/page.tsx";
import { clubPath, membersPath, patterns, testDayPath } from "../../ui/paths.ts";
import { AnswerNotice } from "./answer-notice.tsx";
import { useClubs } from "./club-queries.ts";
import { HalfDone } from "./half-done.tsx";
import { MakeClubSheet } from "./make-club-sheet.tsx";
import { roleWords } from "./role-words.ts";

/** The clubs one is in, with what one does there. */
export default function ClubsPage() {
  const clubs = useClubs();
  const [making, setMaking] = useState(false);
  return (
    <Page
      title="Clubs"
      back={{ to: patterns.shed, label: "Shed" }}
      action={
        <Button
          look={clubs.data?.length ? "quiet" : "primary"}
          wide
          onClick={() => setMaking(true)}
        >
          Make a club
        </Button>
      }
    >
      <AnswerNotice answer={clubs} />
      {clubs.data?.length === 0 && <WhatAClubIs />}
      <ul className="flex flex-col gap-4">
        {clubs.data?.map((club) => (
          <li key={club.id}>
            <ClubCard club={club} />
          </li>
        ))}
      </ul>
      <HalfDone />
      {making && <MakeClubSheet onClose={() => setMaking(false)} />}
    </Page>
  );
}

function ClubCard({ club }: { club: Club }) {
  return (
    <Card aria-labelledby={`club-${club.id}`} className="flex flex-col gap-3">
      <div>
        <h2 id={`club-${club.id}`} className="text-xl wrap-anywhere">
          {club.name}
        </h2>
        <p className="text-soft">{roleWords(club)}</p>
      </div>
      <div className="flex flex-wrap gap-2">
        {club.mechanic && (
          <>
            <ButtonLink look="primary" className="flex-auto" to={clubPath(club.id)}>
              Line-up
            </ButtonLink>
            <ButtonLink className="flex-auto" to={testDayPath(club.id)}>
              Test day
            </ButtonLink>
          </>
        )}
        <ButtonLink className="flex-auto" to={membersPath(club.id)}>
          Members
        </ButtonLink>
      </div>
    </Card>
  );
}

const steps = [
  "An organiser makes the club, and invites riders by a link, its code or an e-mail.",
  "Riders join, and share the bikes they choose. None is shared by itself.",
  "Its mechanics see the shared bikes, the worst first, and log checks for them on a test day.",
];

function WhatAClubIs() {
  return (
    <>
      <p className="text-lg">
        In a club, one who knows oil pumps keeps an eye on the bikes of many. You are in none yet.
      </p>
      <ol className="flex flex-col gap-4">
        {steps.map((step, index) => (
          <li key={step} className="flex gap-3">
            <span aria-hidden className="w-6 shrink-0 text-4xl leading-none font-bold text-oil">
              {index + 1}
            </span>
            <span className="text-lg">{step}</span>
          </li>
        ))}
      </ol>
      <p>To join a club, open the link that its organiser gives you.</p>
    </>
  );
}
