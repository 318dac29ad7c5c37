import { useState } from "react";
import { useNavigate } from "react-router-dom";
import {
  eraseFromPhone,
  forgetAccount,
  NoNetworkError,
  syncNow,
  useSyncStatus,
} from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { patterns } from "../../ui/paths.ts";
import { Sheet } from "../../ui/sheet.tsx";
import { useSubmit } from "../../ui/use-submit.ts";
import { signOut } from "./auth-calls.ts";
import { leaveThisPhone } from "./leave-this-phone.ts";

const NEEDS_NETWORK =
  "Signing out needs the network: only the server can end the session. You are still signed in.";

const endSession = () =>
  signOut().catch((error: unknown) => {
    throw error instanceof NoNetworkError
      ? Object.assign(error, { message: NEEDS_NETWORK })
      : error;
  });

/** Unsent entries are said first. They stay, and are sent when their writer signs in again. */
export function SignOut() {
  const { unsent } = useSyncStatus();
  const [asking, setAsking] = useState(false);
  const navigate = useNavigate();
  const { submit, busy, problem } = useSubmit(async () => {
    await endSession();
    forgetAccount();
    await navigate(patterns.signIn, { replace: true });
  });
  const problemNotice = problem && <Notice tone="error" title={problem} />;
  const words = unsent === 1 ? "1 entry is not sent yet" : `${unsent} entries are not sent yet`;
  return (
    <section className="flex flex-col gap-2 border-t border-rule pt-4">
      <Button disabled={busy} onClick={() => (unsent > 0 ? setAsking(true) : void submit())}>
        Sign out
      </Button>
      {!asking && problemNotice}
      {unsent === 0 && <LeaveAndClear />}
      {asking && (
        <Sheet title={words} onClose={() => setAsking(false)}>
          <div className="flex flex-col gap-3">
            <p>
              If you sign out now they stay on this phone, out of sight, and are sent when you sign
              in here again.
            </p>
            {problemNotice}
            <Button look="danger" wide disabled={busy} onClick={() => void submit()}>
              Sign out, keep them here
            </Button>
            <Button
              look="primary"
              wide
              onClick={() => {
                void syncNow();
                setAsking(false);
              }}
            >
              Send them first
            </Button>
          </div>
        </Sheet>
      )}
    </section>
  );
}

/** For a phone that is lent or given away: the log is on the server, and leaves this one. */
function LeaveAndClear() {
  const { submit, busy, problem } = useSubmit(async () => {
    await endSession();
    await eraseFromPhone();
    leaveThisPhone("cleared");
  });
  return (
    <>
      <Button disabled={busy} onClick={() => void submit()}>
        Leave, and clear this phone
      </Button>
      <p className="text-soft">
        For a phone that is not yours: you are signed out, and your logbook is taken off it.
      </p>
      {problem && <Notice tone="error" title={problem} />}
    </>
  );
}
