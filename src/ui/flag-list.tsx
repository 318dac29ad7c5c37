import { flagSentences, type FlagCode } from "../../shared/delivery/flags.ts";
import { CautionIcon } from "./icons.tsx";

const isFlag = (flag: string): flag is FlagCode => flag in flagSentences;

interface Props {
  flags: readonly string[];
  /** Flags that the page says elsewhere, with what to do about them. */
  saidElsewhere: readonly FlagCode[];
  /** Sentences that belong here and are no flag. */
  more?: readonly string[];
}

/** What has to be said beside a verdict, in words. A flag of a newer app has none here. */
export function FlagList({ flags, saidElsewhere, more = [] }: Props) {
  const shown = [...new Set(flags)].filter(isFlag).filter((flag) => !saidElsewhere.includes(flag));
  const sentences: string[] = [...shown.map((flag) => flagSentences[flag]), ...more];
  if (sentences.length === 0) return null;
  return (
    <ul className="flex flex-col gap-1">
      {sentences.map((sentence) => (
        <li key={sentence} className="flex gap-2">
          <CautionIcon className="mt-0.5 size-5 shrink-0 text-dropping" />
          {sentence}
        </li>
      ))}
    </ul>
  );
}
