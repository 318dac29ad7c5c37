import { useState } from "react";
import { premixMl } from "../../../../shared/delivery/premix-ml.ts";
import { Fold } from "../../../ui/fold.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { NumberField } from "../../../ui/number-field.tsx";
import { parseDecimal } from "../../../ui/parse-decimal.ts";
import { parseRatio } from "../../../ui/parse-ratio.ts";
import { TextField } from "../../../ui/text-field.tsx";

/** The arithmetic of mixing oil into the fuel, with what it cannot do. */
export function Premix() {
  const [litres, setLitres] = useState("5");
  const [ratio, setRatio] = useState("50:1");
  const fuelToOil = parseRatio(ratio);
  const oilMl = fuelToOil === null ? null : premixMl(parseDecimal(litres) ?? NaN, fuelToOil);
  return (
    <Fold title="Mixing oil into the fuel while in doubt">
      <div className="flex flex-col gap-4">
        <Notice tone="caution" title="It never lifts a stop">
          <p>
            Oil in the fuel may hardly reach the crank bearings where the fuel is injected above the
            crankcase.
          </p>
        </Notice>
        <NumberField
          label="Fuel"
          value={litres}
          onChange={setLitres}
          step={1}
          min={0}
          unit="litres"
        />
        <TextField
          label="Fuel to oil"
          hint="Such as 50:1."
          inputMode="text"
          autoComplete="off"
          value={ratio}
          onChange={(event) => setRatio(event.target.value)}
        />
        <p role="status" className="text-xl">
          {oilMl === null ? (
            "Type the litres and the ratio."
          ) : (
            <>
              Oil to mix in: <strong>{Math.round(oilMl)} mL</strong>
            </>
          )}
        </p>
      </div>
    </Fold>
  );
}
