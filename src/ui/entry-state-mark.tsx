import { TickIcon, PhoneIcon, CloseIcon } from "./icons.tsx";

const states = {
  saved: { Icon: PhoneIcon, word: "Saved on this phone", ink: "text-ink" },
  sent: { Icon: TickIcon, word: "Sent", ink: "text-soft" },
  refused: { Icon: CloseIcon, word: "Not accepted", ink: "text-low font-bold" },
};

/** Where an entry is. */
export function EntryStateMark({ state }: { state: keyof typeof states }) {
  const { Icon, word, ink } = states[state];
  return (
    <span className={`inline-flex items-center gap-1 ${ink}`}>
      <Icon className="size-4 shrink-0" />
      {word}
    </span>
  );
}
