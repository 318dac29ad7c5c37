import { useState } from "react";
import type { BikeWithLog } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { DeleteBikeSheet } from "./delete-bike-sheet.tsx";

export function DeleteBike({ bike }: { bike: BikeWithLog }) {
  const [asking, setAsking] = useState(false);
  return (
    <div className="flex flex-col gap-2">
      <p>Deleting erases the bike and its whole log, on every phone and on the server.</p>
      <Button look="danger" onClick={() => setAsking(true)}>
        Delete this bike
      </Button>
      {asking && <DeleteBikeSheet bike={bike} onClose={() => setAsking(false)} />}
    </div>
  );
}
