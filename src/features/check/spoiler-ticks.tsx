import type { Spoiler } from "../../../shared/schemas/entry.ts";
import { Fold } from "../../ui/fold.tsx";
import { TickGroup } from "../../ui/tick-group.tsx";

/** What to look at, as a rider would say it who could not put it right. */
const spoilerLines: Record<Spoiler, string> = {
  "hose-in-oil": "The hose hung in the oil while I read: it reads far too high",
  "barrel-not-upright": "The barrel does not stand upright, tip plugged, plunger out",
  "tip-leaked": "The tip leaked",
  "eye-off-level": "My eye was above or below the level",
  "oil-film": "A film of oil ran down after I read the start",
  bubbles: "There are bubbles in the line",
  "cold-oil": "The oil is cold",
  "weak-battery": "The battery is weak",
  "low-tank": "The oil tank is low",
  "drip-wait-varied": "I did not wait the full 30 s for the last drops",
};

interface Props {
  title: string;
  offered: readonly Spoiler[];
  chosen: readonly Spoiler[];
  onChange: (offered: readonly Spoiler[], chosen: Spoiler[]) => void;
}

/** What spoils a reading and could not be put right: it stays marked on the check. */
export function SpoilerTicks({ title, offered, chosen, onChange }: Props) {
  const count = offered.filter((spoiler) => chosen.includes(spoiler)).length;
  return (
    <Fold title={count > 0 ? `${title}: ${count} ticked` : title}>
      <TickGroup
        label="Put right what you can, tick what you cannot"
        hint="The check still counts, and says so."
        options={offered.map((value) => ({ value, label: spoilerLines[value] }))}
        chosen={chosen}
        onChange={(ticked) => onChange(offered, ticked)}
      />
    </Fold>
  );
}
