import { usualSequences } from "../../../../shared/delivery/usual-sequences.ts";
import { Choice } from "../../../ui/choice.tsx";
import { sequenceWords } from "../../../ui/sequence-words.ts";
import { asSequence } from "../draft/sequence-of.ts";
import { useOpenCheck } from "../open-check.ts";

const FIND_OUT = "find-out";

/** The priming sequence: the bike's own, one chosen here, or one that the first run will show. */
export function SequencePart() {
  const { draft, change, record } = useOpenCheck();
  const known = record.details.sequence;
  if (known)
    return (
      <p>
        <strong className="block">Priming sequence</strong>
        {sequenceWords(known)}
      </p>
    );
  const chosen = draft.sequence;
  const usual = usualSequences.find(
    ({ seconds, rhythm }) => seconds === chosen?.seconds && rhythm === chosen.rhythm,
  );
  const options = [
    { value: FIND_OUT, label: "Find it out from the first run" },
    ...usualSequences.map((one) => ({
      value: one.id,
      label: sequenceWords(one),
      hint: `Delivers about ${one.nominalMl}\u00a0mL.`,
    })),
    ...(chosen && !usual
      ? [{ value: "own", label: sequenceWords(chosen), hint: "Found out." }]
      : []),
  ];
  const pick = (value: string) => {
    if (value === "own") return;
    const one = usualSequences.find(({ id }) => id === value);
    change((now) => ({ ...now, sequence: one ? asSequence(one) : null }));
  };
  return (
    <Choice
      label="Priming sequence"
      stacked
      options={options}
      value={usual?.id ?? (chosen ? "own" : FIND_OUT)}
      onChange={pick}
    />
  );
}
