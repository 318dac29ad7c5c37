import { Choice } from "../../../ui/choice.tsx";
import { sequenceWords } from "../../../ui/sequence-words.ts";
import { runAt } from "../draft/check-draft.ts";
import { proposeSequences } from "../draft/sequence-of.ts";
import { useOpenCheck } from "../open-check.ts";

const LATER = "later";

/** What the first run showed of an unknown sequence: proposed, and taken only when confirmed. */
export function FoundSequence({ n }: { n: number }) {
  const { draft, change, record } = useOpenCheck();
  const run = runAt(draft, n);
  const proposed = record.details.sequence || run.voided ? null : proposeSequences(run);
  if (record.details.sequence) return null;
  if (!proposed)
    return draft.sequence || run.seconds === null ? null : (
      <p>Say on the run’s page how it ticked, and the app proposes which sequence it is.</p>
    );
  const { usual, own } = proposed;
  const options = [
    ...(usual
      ? [
          {
            value: "usual",
            label: sequenceWords(usual),
            hint: `A usual kind; about ${usual.nominalMl}\u00a0mL.`,
          },
        ]
      : []),
    { value: "own", label: sequenceWords(own), hint: "Of its own, as measured." },
    { value: LATER, label: "Not sure yet" },
  ];
  const pick = (value: string) =>
    change((now) => ({
      ...now,
      sequence: value === LATER ? null : value === "usual" ? usual : own,
    }));
  const chosen = draft.sequence;
  const isUsual = usual && chosen?.seconds === usual.seconds && chosen.rhythm === usual.rhythm;
  return (
    <Choice
      label="Which priming sequence is it?"
      hint={
        record.access === "owner"
          ? "Once chosen, the bike keeps it; runs of another length or rhythm are then not counted."
          : "Only its owner can note it on the bike; here it says how many runs to do."
      }
      stacked
      options={options}
      value={chosen === null ? null : isUsual ? "usual" : "own"}
      onChange={pick}
    />
  );
}
