import type { Summary } from "../../shared/schemas/summary.ts";
import { CautionIcon } from "./icons.tsx";
import { parseHours } from "./parse-hours.ts";
import { unlikelyGain } from "./unlikely-gain.ts";

interface Props {
  hours: Summary["hours"];
  /** As typed. */
  text: string;
  at: string;
}

/** One sentence beside the hours field, where what is typed there may be a slip. */
export function AskAboutGain({ hours, text, at }: Props) {
  const question = unlikelyGain(hours, parseHours(text), at);
  return (
    <div role="status">
      {question && (
        <p className="mt-1 flex gap-2 font-bold text-dropping">
          <CautionIcon className="mt-0.5 size-5 shrink-0" />
          {question}
        </p>
      )}
    </div>
  );
}
