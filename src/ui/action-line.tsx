import type { Action } from "../../shared/schemas/entry.ts";
import { actionWords } from "./words.ts";

const inks: Record<Action, string> = {
  ride: "text-holding",
  repeat: "text-dropping",
  stop: "text-low",
};

/** What to do, the first thing a rider reads of a verdict. */
export function ActionLine({ action, large = false }: { action: Action; large?: boolean }) {
  return (
    <p className={`leading-tight font-bold ${large ? "text-4xl" : "text-2xl"} ${inks[action]}`}>
      {actionWords[action]}
    </p>
  );
}
