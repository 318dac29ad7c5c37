import { useQuery, useQueryClient } from "@tanstack/react-query";
import type { Device } from "../../../shared/schemas/account.ts";
import { Button } from "../../ui/button.tsx";
import { formatDay, formatWhen } from "../../ui/format-when.ts";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { endDevice, endOtherDevices, readDevices } from "./account-calls.ts";

const queryKey = ["devices"];

/** Where the account is signed in. This device signs out on the account's page. */
export default function DevicesPage() {
  const client = useQueryClient();
  const { data: devices, error } = useQuery({
    queryKey,
    queryFn: readDevices,
    networkMode: "always",
  });
  const { submit, busy, problem } = useSubmit(async () => {
    await endOtherDevices();
    await client.invalidateQueries({ queryKey });
  });
  const others = devices && devices.length > 1;
  return (
    <Page
      title="Devices signed in"
      back={{ to: patterns.account, label: "Account" }}
      action={
        others && (
          <Button look="danger" wide disabled={busy} onClick={() => void submit()}>
            Sign out all the others
          </Button>
        )
      }
    >
      <p>
        A device that is signed out keeps what was saved on it, and sends it once somebody signs in
        there again.
      </p>
      {problem && <Notice tone="error" title={problem} />}
      {!devices && error && <Notice tone="error" title={error.message} />}
      <ul className="divide-y divide-rule border-y border-rule">
        {devices?.map((device) => (
          <DeviceLine key={device.id} device={device} />
        ))}
      </ul>
    </Page>
  );
}

function DeviceLine({ device: { id, name, signedInAt, seenAt, current } }: { device: Device }) {
  const client = useQueryClient();
  const { submit, busy, problem } = useSubmit(async () => {
    await endDevice(id);
    await client.invalidateQueries({ queryKey });
  });
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-3">
      <p>
        <span className="block font-bold">{name || "A device"}</span>
        <span className="block text-soft">Signed in {formatDay(signedInAt)}</span>
        <span className="block text-soft">
          {current ? "This device" : `Last seen ${formatWhen(seenAt)}`}
        </span>
      </p>
      {!current && (
        <Button disabled={busy} aria-label={`Sign out ${name}`} onClick={() => void submit()}>
          Sign out
        </Button>
      )}
      {problem && <Notice tone="error" title={problem} />}
    </li>
  );
}
