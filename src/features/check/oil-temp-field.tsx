import { formatTemperature } from "../../ui/format-quantity.ts";
import { NumberField } from "../../ui/number-field.tsx";

interface Props {
  value: string;
  onChange: (text: string) => void;
  error?: string;
  /** What the oil had at the baseline, where that was noted. */
  baselineC: number | null;
}

export function OilTempField({ baselineC, ...props }: Props) {
  const aim =
    baselineC === null ? "" : ` The baseline was made at ${formatTemperature(baselineC)}.`;
  return (
    <NumberField
      {...props}
      label="Oil temperature"
      hint={`In the tank; may be left empty.${aim}`}
      step={1}
      unit="°C"
    />
  );
}
