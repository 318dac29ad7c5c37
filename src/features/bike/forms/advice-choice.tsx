import { actions, type Action } from "../../../../shared/schemas/entry.ts";
import type { BikeRecord } from "../../../offline/index.ts";
import { Choice } from "../../../ui/choice.tsx";
import { Fold } from "../../../ui/fold.tsx";
import { isStop } from "../../../ui/stop-advised.tsx";
import { actionWords } from "../../../ui/words.ts";

const NONE = "none";

interface Props {
  record: BikeRecord;
  value: Action | undefined;
  onChange: (advice: Action | undefined) => void;
}

/** What a note says to do: a mechanic's advice to the owner, or the word that lifts a *stop*. */
export function AdviceChoice({ record, value, onChange }: Props) {
  const stands = isStop(record.advice);
  const choice = (
    <Choice
      label="Advice"
      hint={
        stands
          ? "A stop stands on this bike. Any other advice lifts it; a note without advice does not."
          : "A stop stands at the top of the bike until a later note lifts it."
      }
      stacked
      options={[
        { value: NONE, label: "None" },
        ...actions.map((action) => ({ value: action, label: actionWords[action] })),
      ]}
      value={value ?? NONE}
      onChange={(advice) => onChange(advice === NONE ? undefined : advice)}
    />
  );
  if (stands || record.access === "mechanic" || value) return choice;
  return <Fold title="Add advice">{choice}</Fold>;
}
