import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { apiRequest, syncNow, type BikeWithLog } from "../../../offline/index.ts";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { patterns } from "../../../ui/paths.ts";
import { saveFile } from "../../../ui/save-file.ts";
import { Sheet } from "../../../ui/sheet.tsx";
import { useSubmit } from "../../../ui/use-submit.ts";
import { logFile } from "./log-file.ts";

interface Props {
  bike: BikeWithLog;
  onClose: () => void;
}

/** Asks twice, and offers the log as a file first: the one thing here that cannot be undone. */
export function DeleteBikeSheet({ bike, onClose }: Props) {
  const { bikeId, details } = bike.record;
  const [sure, setSure] = useState(false);
  const navigate = useNavigate();
  const { submit, busy, problem } = useSubmit(async () => {
    // What still waits here is sent first, so that nothing of the bike comes after its end.
    await syncNow();
    await apiRequest(`/api/bikes/${bikeId}`, { method: "DELETE" });
    await syncNow();
    await navigate(patterns.shed, { replace: true });
  });
  return (
    <Sheet title={`Delete ${details.name}?`} onClose={onClose}>
      <div className="flex flex-col gap-4">
        <p>
          Its {bike.log.length} {bike.log.length === 1 ? "entry goes" : "entries go"} for good. To
          keep them, save the log as a file first. Deleting needs the network.
        </p>
        <Button onClick={() => saveFile(logFile(bike), `log-${bikeId}.json`)}>
          Save the log as a file
        </Button>
        {problem && (
          <Notice tone="error" title={problem}>
            <p>The bike is still on this phone. Try again with the network.</p>
          </Notice>
        )}
        {sure ? (
          <p className="font-bold text-low">This cannot be undone.</p>
        ) : (
          <Button look="danger" onClick={() => setSure(true)}>
            Delete it
          </Button>
        )}
        <Button onClick={onClose}>Keep the bike</Button>
        {sure && (
          <Button look="danger" disabled={busy} onClick={() => void submit()}>
            Yes, delete it for good
          </Button>
        )}
      </div>
    </Sheet>
  );
}
