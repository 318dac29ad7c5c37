import type { Action } from "../../shared/schemas/entry.ts";
import { actionInks, actionWords } from "./words.ts";

interface Props {
  action: Action;
  large?: boolean;
  /** Where it is the one thing the screen is about: read from arm's length. */
  huge?: boolean;
}

/** What to do, the first thing a rider reads of a verdict. */
export function ActionLine({ action, large = false, huge = false }: Props) {
  const size = huge ? "text-[min(15vw,3.75rem)]" : large ? "text-4xl" : "text-2xl";
  return (
    <p className={`leading-tight font-bold ${size} ${actionInks[action]}`}>{actionWords[action]}</p>
  );
}
