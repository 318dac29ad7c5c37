import type { FlagCode } from "../../../../shared/delivery/flags.ts";
import type { Spoiler } from "../../../../shared/schemas/entry.ts";
import { FlagList } from "../../../ui/flag-list.tsx";
import { spoilerWords } from "../../../ui/spoiler-words.ts";

const saidElsewhere: FlagCode[] = ["not-closed-out", "spoiled", "baseline-cannot-settle"];

interface Props {
  flags: readonly string[];
  spoilers: readonly Spoiler[];
}

/** All that has to be said beside the numbers of a check. */
export function CheckFlags({ flags, spoilers }: Props) {
  const named = spoilers.map((one) => spoilerWords[one]).join(", ");
  const more = named ? [`May have spoiled it: ${named}.`] : [];
  return <FlagList flags={flags} saidElsewhere={saidElsewhere} more={more} />;
}
