import { useState } from "react";
import { NumberField } from "../../../ui/number-field.tsx";
import { Tick } from "../../../ui/tick.tsx";
import { EntryForm } from "./entry-form.tsx";
import type { EntryFormProps } from "./entry-form-props.ts";
import { optionalNumber } from "./typed-values.ts";

const asText = (number: number | undefined) => (number === undefined ? "" : String(number));

export function TopupForm({ record, mends }: EntryFormProps<"topup">) {
  const [oil, setOil] = useState(asText(mends?.body.oilMl));
  const [oilFull, setOilFull] = useState(mends?.body.oilFull ?? false);
  const [fuel, setFuel] = useState(asText(mends?.body.fuelL));
  const [fuelFull, setFuelFull] = useState(mends?.body.fuelFull ?? false);
  return (
    <EntryForm
      title="Log a top-up"
      record={record}
      mends={mends}
      makeEntry={(common) => ({
        ...common,
        kind: "topup",
        body: {
          oilMl: optionalNumber(oil),
          oilFull: oilFull || undefined,
          fuelL: optionalNumber(fuel),
          fuelFull: fuelFull || undefined,
        },
      })}
    >
      {(errors) => (
        <>
          <div>
            <NumberField
              label="Oil added"
              error={errors["body.oilMl"]}
              value={oil}
              onChange={setOil}
              step={50}
              min={0}
              unit="mL"
            />
            <Tick checked={oilFull} onChange={setOilFull}>
              The oil tank is full now
            </Tick>
          </div>
          <div>
            <NumberField
              label="Fuel added"
              error={errors["body.fuelL"]}
              value={fuel}
              onChange={setFuel}
              step={0.5}
              min={0}
              unit="L"
            />
            <Tick checked={fuelFull} onChange={setFuelFull}>
              The fuel tank is full now
            </Tick>
          </div>
        </>
      )}
    </EntryForm>
  );
}
