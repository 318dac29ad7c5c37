import { Link } from "react-router-dom";
import { AccountIcon, ClubIcon, ExchangeIcon } from "../ui/icons.tsx";
import { syncNow, useAccount, useSyncStatus } from "../offline/index.ts";
import { patterns } from "../ui/paths.ts";
import { statusWords } from "./status-words.ts";

const iconClass = "flex min-h-target min-w-target items-center justify-center rounded-card";

export function TopBar() {
  const account = useAccount();
  return (
    <header className="border-b border-rule">
      <div className="mx-auto flex w-full max-w-6xl items-center gap-2 py-1 pr-2 pl-4">
        <div className="min-w-0 flex-1">
          <Link to={patterns.shed} className="inline-flex items-center gap-2 text-lg font-bold">
            <img src="/icon.svg" alt="" width="24" height="24" />
            Sumpless
          </Link>
          {account && <StatusLine />}
        </div>
        {account && <SyncButton />}
        {account && (
          <>
            <Link to={patterns.clubs} aria-label="Clubs" className={iconClass}>
              <ClubIcon />
            </Link>
            <Link to={patterns.account} aria-label="Account" className={iconClass}>
              <AccountIcon />
            </Link>
          </>
        )}
      </div>
    </header>
  );
}

function StatusLine() {
  const status = useSyncStatus();
  return (
    <p role="status" className="text-sm leading-tight text-soft">
      {statusWords(status)}
      {status.phase === "signed-out" && <WayOn to={patterns.signIn}>Sign in to send</WayOn>}
      {status.refused > 0 && <WayOn to={patterns.account}>See which</WayOn>}
    </p>
  );
}

function WayOn({ to, children }: { to: string; children: string }) {
  return (
    <>
      {" · "}
      <Link to={to} className="font-bold text-oil underline">
        {children}
      </Link>
    </>
  );
}

function SyncButton() {
  const sending = useSyncStatus().phase === "sending";
  return (
    <button
      type="button"
      aria-label="Send and fetch now"
      disabled={sending}
      onClick={() => void syncNow()}
      className={`${iconClass} disabled:text-soft`}
    >
      <ExchangeIcon />
    </button>
  );
}
