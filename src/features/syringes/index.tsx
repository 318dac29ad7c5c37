import { useState } from "react";
import { saveSyringe, useSyringes, type Syringe } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { Sheet } from "../../ui/sheet.tsx";
import { SyringeForm } from "../../ui/syringe-form.tsx";
import { RetireSyringeSheet } from "./retire-syringe-sheet.tsx";
import { SyringeCard } from "./syringe-card.tsx";
import { changeSyringe } from "./change-syringe.ts";

type Open = { what: "add" } | { what: "change" | "retire"; syringe: Syringe } | null;

/** The syringes in use: those added here, and those found in the rider's checks. */
export default function SyringesPage() {
  const { data: syringes, error } = useSyringes();
  const [open, setOpen] = useState<Open>(null);
  const close = () => setOpen(null);
  return (
    <Page
      title="Syringes"
      back={{ to: patterns.account, label: "Account" }}
      action={
        <Button look="primary" wide onClick={() => setOpen({ what: "add" })}>
          Add a syringe
        </Button>
      }
    >
      {error && <Notice tone="error" title={error.message} />}
      {syringes?.length === 0 && <NoSyringes />}
      <ul className="flex flex-col gap-3">
        {syringes?.map((syringe) => (
          <li key={syringe.id}>
            <SyringeCard
              syringe={syringe}
              onChange={() => setOpen({ what: "change", syringe })}
              onRetire={() => setOpen({ what: "retire", syringe })}
            />
          </li>
        ))}
      </ul>
      {open?.what === "add" && (
        <Sheet title="Add a syringe" onClose={close}>
          <SyringeForm onSave={(syringe) => saveSyringe(syringe).then(close)} />
        </Sheet>
      )}
      {open?.what === "change" && (
        <Sheet title="Change this syringe" onClose={close}>
          <p className="mb-4">
            With other marks it counts as another syringe: the checks already made keep this one.
          </p>
          <SyringeForm
            syringe={open.syringe}
            onSave={(changed) => changeSyringe(open.syringe, changed).then(close)}
          />
        </Sheet>
      )}
      {open?.what === "retire" && <RetireSyringeSheet syringe={open.syringe} onClose={close} />}
    </Page>
  );
}

function NoSyringes() {
  return (
    <p className="text-lg">
      Add the syringe you measure with. How far apart its marks stand decides how small a drop it
      can tell, and how many runs a check needs.
    </p>
  );
}
