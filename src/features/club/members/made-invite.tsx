import { lazy, Suspense, useState } from "react";
import { Button } from "../../../ui/button.tsx";
import { TextField } from "../../../ui/text-field.tsx";

const QrCode = lazy(() => import("./qr-code.tsx"));

interface Props {
  url: string;
  /** Empty where it was not mailed. */
  sentTo: string;
}

/** The link of an invitation, told this once: to be scanned, copied, or handed to another app. */
export function MadeInvite({ url, sentTo }: Props) {
  const [copied, setCopied] = useState(false);
  const copy = async () => {
    await navigator.clipboard.writeText(url);
    setCopied(true);
  };
  const share = () => void navigator.share({ url }).catch(() => undefined);
  return (
    <div className="flex flex-col gap-4">
      <Suspense fallback={<div className="aspect-square w-full max-w-72 self-center" aria-busy />}>
        <QrCode text={url} />
      </Suspense>
      {sentTo && (
        <p>
          It is on its way to <strong className="wrap-anywhere">{sentTo}</strong> as well.
        </p>
      )}
      <TextField
        label="Link"
        hint="It is shown only now: the server keeps no copy. A new one is quickly made."
        readOnly
        value={url}
        onFocus={(event) => event.target.select()}
      />
      <div className="flex flex-wrap gap-2">
        <Button look="primary" className="flex-auto" onClick={() => void copy()}>
          Copy the link
        </Button>
        {"share" in navigator && (
          <Button className="flex-auto" onClick={share}>
            Hand it over
          </Button>
        )}
      </div>
      <p role="status">{copied && "Copied."}</p>
    </div>
  );
}
