import { useLocation, useNavigate } from "react-router-dom";
import { patterns } from "../../ui/paths.ts";

/** Once signed in, back to where the rider was going. */
export function useWayIn() {
  const navigate = useNavigate();
  const state = useLocation().state as { from?: string } | null;
  return { state, goOn: () => navigate(state?.from ?? patterns.shed, { replace: true }) };
}
