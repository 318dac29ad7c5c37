import { CloseIcon, TickIcon } from "../../../ui/icons.tsx";

const shared = [
  "The bike’s name, make, model and settings",
  "Engine hours and delivery checks",
  "Work, top-ups and notes, with the name of who wrote each",
];
const never = ["Your e-mail address", "Where you live, or where you ride", "Your other bikes"];

/** What consent is given to. */
export function WhatIsShared() {
  return (
    <section aria-labelledby="what" className="flex flex-col gap-3 border-t border-rule pt-4">
      <h2 id="what" className="text-2xl">
        What a club’s mechanics see
      </h2>
      <List items={shared} />
      <h3 className="text-lg">Never</h3>
      <List items={never} never />
      <p>
        They may log hours, checks, work and notes on it, and strike only what they wrote
        themselves. Withdraw it, and it is gone from the server’s Line-up at once, and from their
        phones when these next have a network. What they logged stays in your log.
      </p>
    </section>
  );
}

function List({ items, never = false }: { items: string[]; never?: boolean }) {
  const Icon = never ? CloseIcon : TickIcon;
  return (
    <ul className="flex flex-col gap-1">
      {items.map((item) => (
        <li key={item} className="flex gap-2">
          <Icon className={`shrink-0 ${never ? "text-low" : "text-holding"}`} />
          {item}
        </li>
      ))}
    </ul>
  );
}
