import { Flame, KeyRound, Trash2, Wind } from "lucide-react";
import { useState, type ReactNode } from "react";
import { CautionIcon } from "../../ui/icons.tsx";
import { Sheet } from "../../ui/sheet.tsx";

/** What can hurt the rider or the bike; read in full before the first run ever. */
const cautions = [
  {
    Icon: Wind,
    title: "Petrol vapour",
    text: "Cold engine, open air, an extinguisher at hand.",
  },
  { Icon: Flame, title: "No flame, no spark", text: "No smoking, no heater, no grinder near by." },
  {
    Icon: CautionIcon,
    title: "Never start the engine with the oil hose off",
    text: "It would run without oil and be ruined within moments.",
  },
  {
    Icon: KeyRound,
    title: "Trigger the sequence only as the bike’s workshop manual says",
    text: "Bridging the wrong terminals can destroy the controller.",
  },
  {
    Icon: Trash2,
    title: "Gloves on; used oil is waste",
    text: "Collect it, and hand it in as your local rules say.",
  },
];

export function Cautions() {
  return (
    <>
      <ul className="flex flex-col gap-4">
        {cautions.map(({ Icon, title, text }) => (
          <li key={title} className="flex gap-3">
            <Icon aria-hidden className="mt-1 size-7 shrink-0 text-dropping" />
            <p>
              <strong className="block text-lg leading-snug">{title}</strong>
              {text}
            </p>
          </li>
        ))}
      </ul>
      <p className="border-t border-rule pt-4">
        What the app says is a guide. The maker’s manual, local codes and a licensed mechanic come
        first; in doubt, do not ride.
      </p>
    </>
  );
}

/** The cautions in one line, in full one tap away. */
export function CautionsLine({ children }: { children?: ReactNode }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button
        type="button"
        onClick={() => setOpen(true)}
        className="flex min-h-target w-full items-center gap-2 rounded-card border border-dropping px-3 py-1 text-left leading-tight"
      >
        <CautionIcon aria-hidden className="size-6 shrink-0 text-dropping" />
        <span>
          {children ?? "Cold engine, open air, no flame. Never start it with the hose off."}{" "}
          <span className="font-bold text-oil underline">Cautions</span>
        </span>
      </button>
      {open && (
        <Sheet title="Cautions" onClose={() => setOpen(false)}>
          <div className="flex flex-col gap-4">
            <Cautions />
          </div>
        </Sheet>
      )}
    </>
  );
}
