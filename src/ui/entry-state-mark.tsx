import { Check, Smartphone, X } from "lucide-react";

const states = {
  saved: { Icon: Smartphone, word: "Saved on this phone", ink: "text-ink" },
  sent: { Icon: Check, word: "Sent", ink: "text-soft" },
  refused: { Icon: X, word: "Not accepted", ink: "text-low font-bold" },
};

/** Where an entry is. */
export function EntryStateMark({ state }: { state: keyof typeof states }) {
  const { Icon, word, ink } = states[state];
  return (
    <span className={`inline-flex items-center gap-1 ${ink}`}>
      <Icon aria-hidden className="size-4 shrink-0" />
      {word}
    </span>
  );
}
