import type { Club, Share } from "../../../../shared/schemas/club.ts";
import { syncNow, useAccount } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Card } from "../../../ui/card.tsx";
import { formatDay } from "../../../ui/format-when.ts";
import { Notice } from "../../../ui/notice.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { useMembers } from "../club-queries.ts";
import { useAskAnew } from "../use-kept-answer.ts";
import { inWords } from "./in-words.ts";
import { changeShare } from "./use-shares.ts";

interface Props {
  bikeId: string;
  club: Club;
  /** Null while the club does not see the bike. */
  share: Share | null;
}

/** One club: whether it sees the bike, who of it, and the switch. */
export function ShareCard({ bikeId, club, share }: Props) {
  const askAnew = useAskAnew();
  const { submit, busy, problem } = useSubmit(async () => {
    // The server must have the bike before it can show it to anyone.
    if (!share) await syncNow();
    await changeShare(bikeId, club.id, !share);
    await askAnew();
  });
  return (
    <Card aria-labelledby={`share-${club.id}`} className="flex flex-col gap-3">
      <div>
        <h2 id={`share-${club.id}`} className="text-xl wrap-anywhere">
          {club.name}
        </h2>
        <p role="status" className={share ? "font-bold text-holding" : "text-soft"}>
          {share ? `Shared since ${formatDay(share.since)}` : "Not shared"}
        </p>
      </div>
      <WhoSees club={club} share={share} />
      {problem && <Notice tone="error" title={problem} />}
      <Button
        look={share ? "quiet" : "primary"}
        disabled={busy}
        aria-describedby={`share-${club.id}`}
        onClick={() => void submit()}
      >
        {share ? "Withdraw it" : "Share it"}
      </Button>
    </Card>
  );
}

function WhoSees({ club, share }: Pick<Props, "club" | "share">) {
  const me = useAccount()?.id;
  const members = useMembers(club.id).data;
  const mechanics =
    share?.mechanics ??
    members?.filter(({ id, mechanic }) => mechanic && id !== me).map(({ name }) => name);
  if (!mechanics) return null;
  if (mechanics.length === 0) return <p>The club has no other mechanic at present.</p>;
  return (
    <p className="wrap-anywhere">
      {share ? "Seen by " : "Would be seen by "}
      <strong>{inWords(mechanics)}</strong>.
    </p>
  );
}
