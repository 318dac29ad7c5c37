import { Button } from "../ui/button.tsx";
import { applyUpdate, useUpdateReady } from "./service-worker.ts";

/** Offered, never forced: the rider says when, and not while a form is open. */
export default function UpdateBanner() {
  const ready = useUpdateReady();
  return (
    <div role="status">
      {ready && (
        <div className="mx-auto flex w-full max-w-6xl flex-wrap items-center justify-between gap-2 border-b border-rule px-4 py-2">
          <p>A new version of the app is ready.</p>
          <Button onClick={() => void applyUpdate()}>Use it now</Button>
        </div>
      )}
    </div>
  );
}
