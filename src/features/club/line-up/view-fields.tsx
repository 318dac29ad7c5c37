import { Fold } from "../../../ui/fold.tsx";
import { SelectField } from "../../../ui/select-field.tsx";
import { TextField } from "../../../ui/text-field.tsx";
import { shows, type ShowName } from "./line-up-views.ts";
import { ORDER_SENTENCE } from "./line-up-words.ts";
import type { View } from "./use-view.ts";

interface Props {
  view: View;
  onView: (change: Partial<View>) => void;
  /** The table's own headings sort it too. */
  wide: boolean;
}

const showNames = Object.keys(shows) as ShowName[];

/** The orders that are asked for; the table's headings offer each the other way round as well. */
const orders = [
  { value: "worst", label: "Worst first", descending: false },
  { value: "due", label: "Fewest hours left", descending: false },
  { value: "ratio", label: "Lowest delivery", descending: false },
  { value: "trend", label: "Falling fastest", descending: false },
  { value: "checked", label: "Longest unchecked", descending: false },
  { value: "pump", label: "Longest on one pump", descending: true },
  { value: "bike", label: "Name", descending: false },
  { value: "owner", label: "Owner", descending: false },
];

/** What to look for; on a phone which bikes, and in which order, is one tap away. */
export function ViewFields({ view, onView, wide }: Props) {
  const find = (
    <TextField
      label="Find"
      placeholder="Bike, owner or tag"
      type="search"
      autoComplete="off"
      value={view.find}
      onChange={(event) => onView({ find: event.target.value })}
    />
  );
  const choices = <Choices view={view} onView={onView} />;
  if (wide)
    return (
      <div className="grid grid-cols-[2fr_1fr_1fr] gap-3">
        {find}
        {choices}
      </div>
    );
  const order = orders.find(({ value }) => value === view.order)?.label ?? "Worst first";
  return (
    <div>
      {find}
      <Fold title={`${shows[view.show].label}: ${order.toLowerCase()}`}>
        <div className="flex flex-col gap-3">
          {choices}
          <p className="text-soft">{ORDER_SENTENCE}</p>
        </div>
      </Fold>
    </div>
  );
}

function Choices({ view, onView }: Omit<Props, "wide">) {
  const setOrder = (order: string) =>
    onView({ order, descending: orders.find(({ value }) => value === order)?.descending });
  return (
    <>
      <SelectField
        label="Show"
        value={view.show}
        onChange={(show) => onView({ show })}
        options={showNames.map((value) => ({ value, label: shows[value].label }))}
      />
      <SelectField label="Order" value={view.order} onChange={setOrder} options={orders} />
    </>
  );
}
