import { ButtonLink } from "../../../ui/button-link.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { closeOutPath } from "../../../ui/paths.ts";

/** The one thing that comes before any verdict. */
export function HoseMaybeOff({ bikeId }: { bikeId: string }) {
  return (
    <Notice tone="error" title="Hose may be off: do not start">
      <p>
        The last check was not closed out. Put the oil hose back and clip it, prime the line until
        it is free of bubbles, and look for leaks.
      </p>
      <ButtonLink look="danger" to={closeOutPath(bikeId)}>
        Close it out
      </ButtonLink>
    </Notice>
  );
}
