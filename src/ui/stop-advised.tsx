import type { AdviceNote } from "../../shared/logbook/standing-advice.ts";
import { ButtonLink } from "./button-link.tsx";
import { formatDay } from "./format-when.ts";
import { Notice } from "./notice.tsx";
import { logEntryPath } from "./paths.ts";
import { actionWords } from "./words.ts";

/** A *stop* that somebody wrote: it stands, whatever is measured, until a later note lifts it. */
export function StopAdvised({ advice }: { advice: AdviceNote }) {
  const { author, at, bikeId, body } = advice;
  return (
    <Notice tone="error" title={actionWords.stop}>
      <p className="wrap-anywhere">
        <strong>{author?.name}</strong> wrote on {formatDay(at)}: {body.text}
      </p>
      <ButtonLink to={logEntryPath(bikeId, "note")}>Lift it by a note</ButtonLink>
    </Notice>
  );
}

export const isStop = (advice: AdviceNote | null): advice is AdviceNote =>
  advice?.body.advice === "stop";
