import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { Club } from "../../../../shared/schemas/club.ts";
import { syncNow, useAccount } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { patterns } from "../../../ui/paths.ts";
import { Sheet } from "../../../ui/sheet.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { closeClub, removeMember } from "../club-calls.ts";
import { useAskAnew } from "../use-kept-answer.ts";

const ends = {
  leave: {
    button: "Leave the club",
    sure: "Yes, leave it",
    text: "Your bikes are then no longer shared with it, and its bikes leave this phone. What you logged on them stays in their logs.",
  },
  close: {
    button: "Close the club",
    sure: "Yes, close it for everyone",
    text: "The club ends for all its members: nothing is shared through it any more, and its invitations end. The bikes and their logs stay with their owners. This cannot be undone.",
  },
} as const;

/** The ways out of a club; closing it is an organiser's. */
export function LeaveClub({ club }: { club: Club }) {
  const [asking, setAsking] = useState<keyof typeof ends | null>(null);
  return (
    <section aria-label="Leaving" className="flex flex-wrap gap-2 border-t border-rule pt-4">
      <Button className="flex-auto" onClick={() => setAsking("leave")}>
        {ends.leave.button}
      </Button>
      {club.organiser && (
        <Button look="danger" className="flex-auto" onClick={() => setAsking("close")}>
          {ends.close.button}
        </Button>
      )}
      {asking && <EndSheet club={club} end={asking} onClose={() => setAsking(null)} />}
    </section>
  );
}

interface Props {
  club: Club;
  end: keyof typeof ends;
  onClose: () => void;
}

function EndSheet({ club, end, onClose }: Props) {
  const me = useAccount()?.id ?? "";
  const askAnew = useAskAnew();
  const navigate = useNavigate();
  const { submit, busy, problem } = useSubmit(async () => {
    await (end === "close" ? closeClub(club.id) : removeMember(club.id, me));
    await navigate(patterns.clubs, { replace: true });
    await askAnew();
    // Its bikes leave this phone at once, and not at the next occasion.
    await syncNow();
  });
  return (
    <Sheet title={`${ends[end].button}?`} onClose={onClose}>
      <div className="flex flex-col gap-3">
        <p>{ends[end].text}</p>
        {problem && <Notice tone="error" title={problem} />}
        <Button look="danger" wide disabled={busy} onClick={() => void submit()}>
          {ends[end].sure}
        </Button>
        <Button wide onClick={onClose}>
          Stay
        </Button>
      </div>
    </Sheet>
  );
}
