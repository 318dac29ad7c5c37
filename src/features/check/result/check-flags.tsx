import { flagSentences, type FlagCode } from "../../../../shared/delivery/flags.ts";
import type { Spoiler } from "../../../../shared/schemas/entry.ts";
import { CautionIcon } from "../../../ui/icons.tsx";
import { spoilerWords } from "../../../ui/spoiler-words.ts";

/** Said by the page itself, with what to do about it. */
const saidElsewhere: readonly string[] = [
  "not-closed-out",
  "spoiled",
  "baseline-cannot-settle",
] satisfies FlagCode[];

const isFlag = (flag: string): flag is FlagCode => flag in flagSentences;

interface Props {
  flags: readonly string[];
  spoilers: readonly Spoiler[];
}

/** All that has to be said beside the numbers. A flag of a newer app has no words here. */
export function CheckFlags({ flags, spoilers }: Props) {
  const sentences: string[] = [...new Set(flags)]
    .filter((flag) => !saidElsewhere.includes(flag))
    .filter(isFlag)
    .map((flag) => flagSentences[flag]);
  if (spoilers.length > 0)
    sentences.push(`May have spoiled it: ${spoilers.map((one) => spoilerWords[one]).join(", ")}.`);
  if (sentences.length === 0) return null;
  return (
    <ul className="flex flex-col gap-2">
      {sentences.map((sentence) => (
        <li key={sentence} className="flex gap-2">
          <CautionIcon className="mt-0.5 size-5 shrink-0 text-dropping" />
          {sentence}
        </li>
      ))}
    </ul>
  );
}
