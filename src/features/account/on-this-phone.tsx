import {
  exportUnsent,
  useStorageHealth,
  useUnsent,
  type StorageHealth,
} from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Fold } from "../../ui/fold.tsx";
import { saveFile } from "../../ui/save-file.ts";
import { UnsentLine } from "./unsent-line.tsx";

const healthWords: Record<StorageHealth, string> = {
  unasked:
    "The browser has not been asked yet to keep what is stored here; the app asks when you first save.",
  persisted: "The browser has promised to keep what is stored here.",
  refused:
    "The browser may clear what is stored here when it runs short of room, or after some days without a visit. Put the app on the home screen, and send when you have a network.",
  unavailable: "This browser keeps nothing once the window is closed. A private window may be why.",
};

/** What is on this phone and nowhere else, and how safe it is here. */
export function OnThisPhone() {
  const { data: unsent } = useUnsent();
  const health = useStorageHealth();
  const save = async () => {
    const day = new Date().toISOString().slice(0, 10);
    saveFile(await exportUnsent(), `sumpless-not-sent-${day}.json`);
  };
  return (
    <section className="flex flex-col gap-2 border-t border-rule pt-4">
      <h2 className="text-xl">On this phone</h2>
      <p>{healthWords[health]}</p>
      {unsent?.length === 0 && <p>Every entry has been sent.</p>}
      {unsent && unsent.length > 0 && (
        <>
          <Fold title={`Not sent yet: ${unsent.length}`}>
            <ul className="divide-y divide-rule border-y border-rule">
              {unsent.map((kept) => (
                <UnsentLine key={kept.entry.id} kept={kept} />
              ))}
            </ul>
          </Fold>
          <Button onClick={() => void save()}>Save these as a file</Button>
        </>
      )}
    </section>
  );
}
