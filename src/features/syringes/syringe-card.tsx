import type { Syringe } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Card } from "../../ui/card.tsx";
import { SyringePicture } from "./syringe-picture.tsx";

interface Props {
  syringe: Syringe;
  onChange: () => void;
  onRetire: () => void;
}

export function SyringeCard({ syringe, onChange, onRetire }: Props) {
  const { label, capacityMl, graduationMl } = syringe;
  return (
    <Card aria-label={label} className="flex items-end gap-4">
      <div className="flex min-w-0 flex-1 flex-col gap-3">
        <div>
          <h2 className="text-xl">{label}</h2>
          <p>
            {capacityMl}&nbsp;mL, marks each {graduationMl}&nbsp;mL
          </p>
        </div>
        <div className="flex flex-wrap gap-2">
          <Button aria-label={`Change ${label}`} onClick={onChange}>
            Change
          </Button>
          <Button aria-label={`Retire ${label}`} onClick={onRetire}>
            Retire
          </Button>
        </div>
      </div>
      <SyringePicture syringe={syringe} />
    </Card>
  );
}
