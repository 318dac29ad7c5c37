import { lazy, Suspense, useState } from "react";
import type { NewInviteResponse } from "../../../../shared/schemas/club.ts";
import { ButtonLink } from "../../../ui/button-link.tsx";
import { Button } from "../../../ui/button.tsx";
import { Notice } from "../../../ui/notice.tsx";
import { patterns } from "../../../ui/paths.ts";
import { TextField } from "../../../ui/text-field.tsx";

const QrCode = lazy(() => import("./qr-code.tsx"));

interface Props {
  made: NewInviteResponse;
  wantedMailed: boolean;
}

/** The link of an invitation, told this once: to be scanned, copied, or handed to another app. */
export function MadeInvite({ made, wantedMailed }: Props) {
  const { url, invite } = made;
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
      {invite.email && (
        <p>
          It is on its way to <strong className="wrap-anywhere">{invite.email}</strong> as well.
        </p>
      )}
      {wantedMailed && !invite.email && (
        <Notice tone="caution" title="It was not mailed">
          <p>
            Your own e-mail address is not confirmed yet. Hand this link over yourself; or confirm
            your address, and make another invitation.
          </p>
          <ButtonLink to={patterns.account}>Confirm my address</ButtonLink>
        </Notice>
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
