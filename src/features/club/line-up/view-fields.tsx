import { SelectField } from "../../../ui/select-field.tsx";
import { TextField } from "../../../ui/text-field.tsx";
import { shows, type ShowName } from "./line-up-views.ts";
import type { View } from "./use-view.ts";

interface Props {
  view: View;
  onView: (change: Partial<View>) => void;
  /** The table's own headings sort it. */
  wide: boolean;
}

const showNames = Object.keys(shows) as ShowName[];

/** As a phone, with no headings to press, offers them. */
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

export function ViewFields({ view, onView, wide }: Props) {
  return (
    <div className="grid grid-cols-2 gap-3 min-[900px]:grid-cols-[2fr_1fr]">
      <div className="max-[900px]:col-span-2">
        <TextField
          label="Find"
          placeholder="Bike, owner or tag"
          type="search"
          autoComplete="off"
          value={view.find}
          onChange={(event) => onView({ find: event.target.value })}
        />
      </div>
      <SelectField
        label="Show"
        value={view.show}
        onChange={(show) => onView({ show })}
        options={showNames.map((value) => ({ value, label: shows[value].label }))}
      />
      {!wide && (
        <SelectField
          label="Order"
          value={view.order}
          onChange={(order) =>
            onView({ order, descending: orders.find(({ value }) => value === order)?.descending })
          }
          options={orders}
        />
      )}
    </div>
  );
}
