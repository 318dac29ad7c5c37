import { NumberField } from "../../ui/number-field.tsx";

interface Props {
  value: string;
  onChange: (text: string) => void;
  error?: string;
}

export function OilTempField(props: Props) {
  return (
    <NumberField
      {...props}
      label="Oil temperature"
      hint="May be left empty. In the tank; warm oil flows as it did at the baseline."
      step={1}
      unit="°C"
    />
  );
}
