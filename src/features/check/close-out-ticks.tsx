import { TickGroup } from "../../ui/tick-group.tsx";
import { closeOutItems, type CloseOutItem } from "./draft/check-draft-schema.ts";

const lines: Record<CloseOutItem, string> = {
  "test-lead-out": "Test lead out",
  "hose-clipped": "Oil hose back on and clipped",
  "line-primed": "Line primed until it is free of bubbles",
  "no-leaks": "No leaks",
  "smoke-as-usual": "Engine started: smoke as usual",
};

interface Props {
  chosen: readonly CloseOutItem[];
  onChange: (chosen: CloseOutItem[]) => void;
}

/** What has to be done before the bike may be started and ridden again. */
export function CloseOutTicks({ chosen, onChange }: Props) {
  return (
    <div className="text-xl">
      <TickGroup
        label="Done, one after the other"
        options={closeOutItems.map((value) => ({ value, label: lines[value] }))}
        chosen={chosen}
        onChange={onChange}
      />
    </div>
  );
}
