import { flagSentences, type FlagCode } from "../../../../shared/delivery/flags.ts";
import { CautionIcon } from "../../../ui/icons.tsx";

/** Said elsewhere on the page, with what to do about it. */
const saidElsewhere: readonly string[] = [
  "not-closed-out",
  "hours-doubtful",
  "baseline-cannot-settle",
  "no-delivery",
] satisfies FlagCode[];

const isFlag = (flag: string): flag is FlagCode => flag in flagSentences;

/** What has to be said beside the verdict, in words. A flag of a newer app has none here. */
export function FlagList({ flags }: { flags: readonly string[] }) {
  const shown = flags.filter((flag) => !saidElsewhere.includes(flag)).filter(isFlag);
  if (shown.length === 0) return null;
  return (
    <ul className="flex flex-col gap-1">
      {shown.map((flag) => (
        <li key={flag} className="flex gap-2">
          <CautionIcon className="mt-0.5 size-5 shrink-0 text-dropping" />
          {flagSentences[flag]}
        </li>
      ))}
    </ul>
  );
}
