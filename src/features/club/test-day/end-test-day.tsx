import { useState } from "react";
import { endTestDay } from "../../../offline/test-day.ts";
import { Button } from "../../../ui/button.tsx";
import { Sheet } from "../../../ui/sheet.tsx";

interface Props {
  clubId: string;
  waiting: number;
}

/** Empties both lists; what was written stays where it is. */
export function EndTestDay({ clubId, waiting }: Props) {
  const [asking, setAsking] = useState(false);
  const end = async () => {
    await endTestDay(clubId);
    setAsking(false);
  };
  return (
    <>
      <Button onClick={() => setAsking(true)}>End the test day</Button>
      {asking && (
        <Sheet title="End the test day?" onClose={() => setAsking(false)}>
          <div className="flex flex-col gap-3">
            <p>
              {waiting > 0 &&
                `${waiting} ${waiting === 1 ? "bike still waits" : "bikes still wait"}. `}
              The lists are emptied, and the syringe is to be chosen anew. Every check stays in its
              bike’s log, and is sent if it was not yet.
            </p>
            <Button look="primary" wide onClick={() => void end()}>
              End it
            </Button>
            <Button wide onClick={() => setAsking(false)}>
              Go on
            </Button>
          </div>
        </Sheet>
      )}
    </>
  );
}
