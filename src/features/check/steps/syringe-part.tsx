import { useSyringes } from "../../../offline/index.ts";
import { Choice } from "../../../ui/choice.tsx";
import { AddSyringe } from "../add-syringe.tsx";
import { useOpenCheck } from "../open-check.ts";
import { SyringeDrawing } from "../syringe-drawing.tsx";
import { syringeOptions } from "../syringe-options.ts";

/** Which syringe, drawn with the marks it has. */
export function SyringePart({ error }: { error?: string }) {
  const { draft, change } = useOpenCheck();
  const { data: syringes = [] } = useSyringes();
  const options = syringeOptions(syringes, draft.syringe);
  const pick = (id: string) =>
    change((now) => ({ ...now, syringe: options.find((one) => one.id === id) ?? now.syringe }));
  return (
    <div className="flex flex-wrap gap-3">
      {draft.syringe && (
        <SyringeDrawing
          syringe={draft.syringe}
          levelMl={null}
          className="h-[224px] w-[112px] shrink-0 self-center"
        />
      )}
      <div className="flex min-w-0 flex-[1_1_10rem] flex-col justify-center gap-2">
        <Choice
          label="Syringe"
          hint={options.length === 0 ? "Add the one you read from." : undefined}
          stacked
          error={error}
          options={options.map(({ id, label, graduationMl }) => ({
            value: id,
            label,
            hint: `${graduationMl}\u00a0mL marks`,
          }))}
          value={draft.syringe?.id ?? null}
          onChange={pick}
        />
        <AddSyringe onAdded={(syringe) => change((now) => ({ ...now, syringe }))} />
      </div>
    </div>
  );
}
