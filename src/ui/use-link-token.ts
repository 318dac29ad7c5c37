import { useLocation } from "react-router-dom";

/** The token of a mailed link. It stands behind the `#`: browsers send it nowhere. */
export function useLinkToken(): string {
  return new URLSearchParams(useLocation().hash.slice(1)).get("token") ?? "";
}
