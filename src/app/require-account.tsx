import { use } from "react";
import { Navigate, Outlet, useLocation } from "react-router-dom";
import { settleAccount, useAccount } from "../offline/index.ts";
import { patterns } from "../ui/paths.ts";

/** A phone that knows its account opens offline and with an expired session; one without signs in. */
export function RequireAccount() {
  const account = useAccount();
  const { pathname } = useLocation();
  // The lasting copy, which takes a moment to read, may still know one.
  if (!account) use(settleAccount());
  // Whoever signs in after a sign-out, which is on the account page, starts in the Shed.
  const from = pathname === patterns.account ? patterns.shed : pathname;
  if (!account) return <Navigate to={patterns.signIn} replace state={{ from }} />;
  return <Outlet />;
}
