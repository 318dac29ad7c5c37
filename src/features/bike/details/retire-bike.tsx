import { saveEntry, type BikeRecord } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";

/** A retired bike leaves the Shed's first rank; its log stays as it is. */
export function RetireBike({ record: { bikeId, details } }: { record: BikeRecord }) {
  const { retired } = details;
  const { submit, busy, problem } = useSubmit(async () => {
    const at = new Date().toISOString();
    await saveEntry({ bikeId, kind: "bike", at, hours: null, body: { retired: !retired } });
  });
  return (
    <div className="flex flex-col gap-2">
      <p>
        {retired
          ? "This bike is retired: it stands at the end of the Shed."
          : "A retired bike moves to the end of the Shed. Its log stays, and it can come back."}
      </p>
      {problem && <p className="font-bold text-low">{problem}</p>}
      <Button disabled={busy} onClick={() => void submit()}>
        {retired ? "Bring it back" : "Retire this bike"}
      </Button>
    </div>
  );
}
