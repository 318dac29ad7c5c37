import { useState } from "react";
import type { Syringe } from "../../../shared/schemas/entry.ts";
import { saveSyringe } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { PlusIcon } from "../../ui/icons.tsx";
import { Sheet } from "../../ui/sheet.tsx";
import { SyringeForm } from "../../ui/syringe-form.tsx";

/** Adds a syringe without leaving the check, and with no signal. */
export function AddSyringe({ onAdded }: { onAdded: (syringe: Syringe) => void }) {
  const [adding, setAdding] = useState(false);
  return (
    <>
      <Button className="self-start" onClick={() => setAdding(true)}>
        <PlusIcon />
        Add a syringe
      </Button>
      {adding && (
        <Sheet title="Add a syringe" onClose={() => setAdding(false)}>
          <SyringeForm
            onSave={async (syringe) => {
              await saveSyringe(syringe);
              onAdded(syringe);
              setAdding(false);
            }}
          />
        </Sheet>
      )}
    </>
  );
}
